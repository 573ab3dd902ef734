import { LedgerRow } from '@/components/ui/LedgerRow';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { formatShortDay } from '@/shared/days';
import type { BroodTold } from './queries';

const WORDS = {
  total: 'in all',
  eggs: 'eggs',
  wrigglers: 'wrigglers',
  freeSwimming: 'free-swimming',
  dead: 'dead',
  deformed: 'deformed',
};

/** What was counted before the head count: eggs, wrigglers, dead ones. */
export function StageCounts({ counts }: { counts: BroodTold['stageCounts'] }) {
  if (counts.length === 0) return null;
  return (
    <Section title="Eggs and wrigglers">
      <Rows>
        {counts.map(({ id, onDay, numbers, by }) => (
          <LedgerRow key={id} date={formatShortDay(onDay)} icon="headCount" event={said(numbers)} by={by} />
        ))}
      </Rows>
    </Section>
  );
}

function said(numbers: BroodTold['stageCounts'][number]['numbers']): string {
  const parts = (Object.keys(WORDS) as (keyof typeof WORDS)[]).flatMap((key) =>
    numbers[key] === null ? [] : [`${numbers[key]} ${WORDS[key]}`],
  );
  return parts.join(', ');
}
