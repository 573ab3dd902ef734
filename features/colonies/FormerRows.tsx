import { Code } from '@/components/ui/Code';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { SexShape } from '@/components/ui/SexShape';
import { useRoom } from '@/hooks/useRoom';
import { formatDate } from '@/shared/days';
import { EXIT_WORDS } from '@/shared/fish/contract';
import type { ColonyTold } from './queries';

/** Those that left: they stay parents of what was bred here. */
export function FormerRows({ former }: { former: ColonyTold['former'] }) {
  const { id: roomId } = useRoom();
  if (former.length === 0) return null;
  return (
    <Section title="Were in it" aside={String(former.length)}>
      <Rows>
        {former.map(({ fish, fromDay, untilDay }) => (
          <Row
            key={`${fish.id} ${fromDay}`}
            href={`/r/${roomId}/fish/${fish.id}`}
            label={`${fish.code ?? 'A fish not told apart'}, until ${formatDate(untilDay)}`}
            margin={<SexShape sex={fish.sex} possible={!fish.sexCertain && fish.sex !== 'unknown'} />}
            title={fish.code ? <Code>{fish.code}</Code> : 'Not told apart'}
            trailing={`${fish.exit && fish.exit.onDay === untilDay ? EXIT_WORDS[fish.exit.kind] : 'Moved'}, ${formatDate(untilDay)}`}
            middle
          />
        ))}
      </Rows>
    </Section>
  );
}
