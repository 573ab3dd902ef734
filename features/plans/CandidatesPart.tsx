import { useState } from 'react';
import { View } from 'react-native';
import { CheckRow } from '@/components/form/CheckRow';
import { space } from '@/components/theme/space';
import { Code } from '@/components/ui/Code';
import { SearchField } from '@/components/ui/SearchField';
import { Section } from '@/components/ui/Section';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { ageWords } from '@/shared/days';
import type { Candidate } from '@/shared/lineage/candidates';
import type { UnitChoices } from '@/shared/units';
import { formatLength } from '@/shared/unitWords';
import type { Plan } from './usePlan';

/** So many that the group that is proposed is still near. */
const MOST_SHOWN = 30;

const DOUBT_WORDS = { tooSmall: 'too small', tooOld: 'too old' };

/** The fish that may be chosen; those too small or too old are left out unless they are taken in. */
export function CandidatesPart({ plan }: { plan: Plan }) {
  const { units } = useRoom();
  const { candidates, isIn, toggle } = plan;
  const [search, setSearch] = useState('');
  const inNow = candidates.filter(isIn).length;
  const words = search.toLowerCase().split(/\s+/);
  const matching = candidates.filter(({ code, tank }) => {
    const text = `${code} ${tank ?? ''}`.toLowerCase();
    return words.every((word) => text.includes(word));
  });
  const shown = candidates.length > MOST_SHOWN ? matching.slice(0, MOST_SHOWN) : candidates;
  return (
    <Section title="To choose from" aside={`${inNow} of ${candidates.length}`}>
      {candidates.length === 0 ? (
        <Text tone="soft">No living breeder or holdback with a code and a sex is here.</Text>
      ) : null}
      {candidates.length > MOST_SHOWN ? (
        <SearchField value={search} onChange={setSearch} placeholder="Fish, tank" />
      ) : null}
      <View role="group" aria-label="Fish to choose from">
        {shown.map((one) => (
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
      {shown.length < matching.length ? (
        <Text size="small" tone="soft">
          {`${matching.length - shown.length} more, chosen from all the same. Type to find one.`}
        </Text>
      ) : null}
      {shown.length === 0 && candidates.length > 0 ? <Text tone="soft">No fish is like that.</Text> : null}
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
