import { Notice } from '@/components/ui/Notice';
import { Text } from '@/components/ui/Text';
import { Part } from '@/features/entries/Part';
import { useRoom } from '@/hooks/useRoom';
import type { Finding } from '@/shared/water/finding';
import { waterChangesFor, waterChangeWords } from '@/shared/water/waterChange';
import { waterFindings } from '@/shared/water/waterFindings';
import type { TankWater } from './queries';
import { readSoFar, type TestDraft } from './testing';

const NO_TAP = { totalAmmoniaNMgL: null, nitriteNMgL: null, nitrateNMgL: null };

/** What the readings mean for the most demanding species of the tank, with what it rests on, and what would bring them back. */
export function Findings({ draft, water }: { draft: TestDraft; water: TankWater }) {
  const { units } = useRoom();
  const test = readSoFar(draft, units);
  if (Object.values(test).every((value) => value === null)) return null;
  const findings = waterFindings(test, water.profiles, units);
  const changes = waterChangesFor(test, NO_TAP);
  const remedy = ({ of }: Finding): string => {
    const change = of === 'ammonia' || of === 'nitrite' || of === 'nitrate' ? changes[of] : null;
    return change && !('none' in change) ? ` ${waterChangeWords(change)}, if the tap has none.` : '';
  };
  return (
    <Part title="What it means" aside={water.profiles.map(({ name }) => name).join(', ') || undefined}>
      {findings.length === 0 ? (
        <Text tone="soft">
          {water.profiles.length > 0 ? 'Within what they ask for.' : 'No species is known of this tank yet.'}
        </Text>
      ) : (
        findings.map((finding) => (
          <Notice
            key={finding.of}
            tone={finding.level}
            title={finding.says}
            words={`${finding.because}${remedy(finding)}`}
          />
        ))
      )}
    </Part>
  );
}
