import { View } from 'react-native';
import { CheckRow } from '@/components/form/CheckRow';
import { space } from '@/components/theme/space';
import { Code } from '@/components/ui/Code';
import { Section } from '@/components/ui/Section';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { ageWords } from '@/shared/days';
import type { Candidate } from '@/shared/lineage/candidates';
import type { UnitChoices } from '@/shared/units';
import { formatLength } from '@/shared/unitWords';
import type { Plan } from './usePlan';

const DOUBT_WORDS = { tooSmall: 'too small', tooOld: 'too old' };

/** The fish that may be chosen; those too small or too old are left out unless they are taken in. */
export function CandidatesPart({ plan }: { plan: Plan }) {
  const { units } = useRoom();
  const { candidates, isIn, toggle } = plan;
  const inNow = candidates.filter(isIn).length;
  return (
    <Section title="To choose from" aside={`${inNow} of ${candidates.length}`}>
      {candidates.length === 0 ? (
        <Text tone="soft">No living breeder or holdback with a code and a sex is here.</Text>
      ) : null}
      <View role="group" aria-label="Fish to choose from">
        {candidates.map((one) => (
          <CheckRow
            key={one.id}
            on={isIn(one)}
            onChange={() => toggle(one)}
            label={`${one.code}, ${one.sex}`}
            note={detailOf(one, units)}
          >
            <View style={{ flexDirection: 'row', alignItems: 'center', gap: space[2] }}>
              <SexShape sex={one.sex} possible={!one.sexCertain} />
              <Code>{one.code}</Code>
            </View>
          </CheckRow>
        ))}
      </View>
    </Section>
  );
}

function detailOf({ tank, ageDays, lengthTenthsMm, doubt }: Candidate, units: UnitChoices): string {
  const parts = [
    doubt ? DOUBT_WORDS[doubt] : null,
    tank,
    ageDays === null ? null : ageWords(ageDays),
    lengthTenthsMm === null ? null : formatLength(lengthTenthsMm, units),
  ];
  return parts.filter((part) => part !== null).join(' · ');
}
