import { Notice } from '@/components/ui/Notice';
import { Text } from '@/components/ui/Text';
import { Part } from '@/features/entries/Part';
import { useRoom } from '@/hooks/useRoom';
import type { FishRow } from '@/shared/fish/contract';
import type { TankRow } from '@/shared/tanks/contract';
import type { TodayFacts } from '@/shared/today/facts';
import { checkAfter, type Moving } from './stocked';

type Props = { tank: TankRow; moving: Moving; fish: readonly FishRow[]; facts: TodayFacts };

/** What the new tank would be like with them in it: advice with reasons, never a refusal. */
export function MoveCheck({ tank, moving, fish, facts }: Props) {
  const { units } = useRoom();
  const check = checkAfter(tank, moving, { fish, facts }, units);
  if (!check) return null;
  return (
    <Part title={`${tank.code} after the move`} aside={`${check.heads} fish`}>
      {check.findings.length === 0 ? (
        <Text tone="soft">Within what the species ask for.</Text>
      ) : (
        check.findings.map(({ of, level, says, because }) => (
          <Notice key={`${of}${says}`} tone={level} title={says} words={because} />
        ))
      )}
    </Part>
  );
}
