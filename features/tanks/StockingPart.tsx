import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Notice } from '@/components/ui/Notice';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import type { SpeciesProfile } from '@/shared/species/profile';
import { stockingCheck } from '@/shared/tanks/stockingCheck';
import { formatVolume, formatWeight } from '@/shared/unitWords';
import type { TankTold } from './queries';

/** Whether tank and company suit each species: advice with reasons, never a refusal. */
export function StockingPart({ told, profiles }: { told: TankTold; profiles: SpeciesProfile[] }) {
  const { units } = useRoom();
  const { tank, lodgers } = told;
  const known = lodgers.filter(({ speciesId }) => profiles.some(({ id }) => id === speciesId));
  if (known.length === 0) return null;
  const { findings, heads, biomassG } = stockingCheck(tank, known, profiles, units);
  const perHead = formatVolume(tank.litres / Math.max(1, heads), units);
  return (
    <Section
      title="Stocking"
      aside={findings.length === 0 ? 'within what they ask for' : `${findings.length} to look at`}
    >
      <View style={{ gap: space[2] }}>
        <Text>
          <Text strong>{`${perHead} a head`}</Text>
          <Text tone="soft">
            {biomassG === null
              ? ' · weight not known: not all were measured'
              : ` · about ${formatWeight(biomassG)} of fish, by length`}
          </Text>
        </Text>
        {findings.map(({ of, level, says, because }) => (
          <Notice key={`${of}${says}`} tone={level} title={says} words={because} />
        ))}
      </View>
    </Section>
  );
}
