import type { Href } from 'expo-router';
import { Code } from '@/components/ui/Code';
import { KeyValues } from '@/components/ui/KeyValues';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { useRoom } from '@/hooks/useRoom';
import { formatDate } from '@/shared/days';
import { PROVENANCE_WORDS, PROVENANCES } from '@/shared/strains/contract';
import type { FishTold } from './queries';

const KEPT_WORDS = { breeder: 'Breeder', holdback: 'Holdback', other: 'Kept' };
const ORIGIN_WORDS = { founder: 'Came from outside', bred: 'Bred here', imported: 'Came with a lineage sheet' };

/** Where it came from, where it lives and has lived. */
export function FishFacts({ told }: { told: FishTold }) {
  const { id: roomId } = useRoom();
  const { fish, lot, colonies, tanks } = told;
  const home = `/r/${roomId}` as const;
  const link = (code: string, to: Href) => <TextLink label={code} href={to} />;
  const spans = (stays: FishTold['tanks']) =>
    stays.map(({ id, code, fromDay, untilDay }) => (
      <Text key={`${id} ${fromDay}`} size="small">
        <Code>{code}</Code>
        {` from ${formatDate(fromDay)}${untilDay ? ` until ${formatDate(untilDay)}` : ''}`}
      </Text>
    ));
  const provenance = PROVENANCES.find((one) => one === lot?.provenance);
  const pairs = [
    { key: 'Kept as', value: KEPT_WORDS[fish.keptAs] },
    { key: 'Origin', value: ORIGIN_WORDS[fish.origin] },
    fish.strainId
      ? { key: 'Strain', value: link(fish.strainCode ?? 'Strain', `${home}/strains/${fish.strainId}`) }
      : null,
    fish.brood ? { key: 'Out of', value: link(fish.brood.code, `${home}/broods/${fish.brood.id}`) } : null,
    lot
      ? {
          key: 'Lot',
          value: [provenance ? PROVENANCE_WORDS[provenance] : null, lot.fromWhom, formatDate(lot.receivedOn)]
            .filter(Boolean)
            .join(', '),
        }
      : null,
    fish.arrivedOn ? { key: 'Came in', value: formatDate(fish.arrivedOn) } : null,
    fish.bornOn ? { key: 'Born', value: formatDate(fish.bornOn) } : null,
    fish.colony ? { key: 'Colony', value: link(fish.colony.code, `${home}/colonies/${fish.colony.id}`) } : null,
    colonies.length > 1 ? { key: 'Colonies', value: <>{spans(colonies)}</> } : null,
    tanks.length > 0 ? { key: 'Tanks', value: <>{spans(tanks)}</> } : null,
  ].flatMap((pair) => pair ?? []);
  return (
    <Section title="Where from, where it lives">
      <KeyValues pairs={pairs} />
    </Section>
  );
}
