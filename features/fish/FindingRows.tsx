import { LedgerRow } from '@/components/ui/LedgerRow';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { formatDate } from '@/shared/days';
import type { Finding } from '@/shared/fish/contract';

const HOW_WORDS = { seen: 'by eye', vented: 'vented', dna: 'by DNA', told: 'as told' };
const KIND_WORDS = { sex: 'Sex', dominance: 'Dominance', mark: 'Mark', check: 'Check', condition: 'Condition' };
const VALUE_WORDS: Record<string, string> = { unknown: 'not known', none: 'none', notDominant: 'no longer dominant' };

/** What was found out about it, by whom and how: sex and marks change, so each is a dated fact. */
export function FindingRows({ findings }: { findings: readonly Finding[] }) {
  if (findings.length === 0) return null;
  return (
    <Section title="Found out" aside={String(findings.length)}>
      <Rows>
        {findings.map(({ id, kind, onDay, value, how, certain, note, by }) => (
          <LedgerRow
            key={id}
            date={formatDate(onDay)}
            event={[
              `${KIND_WORDS[kind]}: ${VALUE_WORDS[value] ?? value}`,
              how ? HOW_WORDS[how] : null,
              certain ? null : 'not certain',
              note,
            ]
              .filter(Boolean)
              .join(', ')}
            by={by}
          />
        ))}
      </Rows>
    </Section>
  );
}
