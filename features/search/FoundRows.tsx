import { Code } from '@/components/ui/Code';
import { Icon } from '@/components/ui/Icon';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import type { Found } from '@/shared/search/contract';
import { LOOKS } from './things';

export const hrefOf = (roomId: string, { thing, id }: Found) => `/r/${roomId}/${LOOKS[thing].folder}/${id}` as const;

/** What was found, each a link to its page. */
export function FoundRows({ found, label }: { found: Found[]; label: string }) {
  const { id: roomId } = useRoom();
  return (
    <Rows label={label}>
      {found.map((one) => {
        const { thing, id, code, name, gone } = one;
        const word = gone ? LOOKS[thing].gone : LOOKS[thing].word;
        return (
          <Row
            key={`${thing}:${id}`}
            href={hrefOf(roomId, one)}
            label={[code, word, name].filter(Boolean).join(', ')}
            title={
              thing === 'species' ? (
                <Text italic strong>
                  {code}
                </Text>
              ) : (
                <Code>{code}</Code>
              )
            }
            note={name ?? undefined}
            trailing={word}
            end={<Icon name="next" tone="soft" />}
            middle
          />
        );
      })}
    </Rows>
  );
}
