import { useQuery } from '@tanstack/react-query';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { useRoom } from '@/hooks/useRoom';
import { contradictionsQuery } from './queries';

/** Says that something does not fit, where there is anything. */
export function ContradictionsLink() {
  const room = useRoom();
  const { data } = useQuery(contradictionsQuery(room.id));
  if (!data || data.length === 0) return null;
  const words =
    data.length === 1
      ? 'One thing recorded of parents cannot be true.'
      : `${data.length} things recorded of parents cannot be true.`;
  return (
    <Notice tone="look" words={words}>
      <Button small label="Contradictions" href={`/r/${room.id}/lineage/checks`} />
    </Notice>
  );
}
