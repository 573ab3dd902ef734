import type * as z from 'zod/mini';
import { Code } from '@/components/ui/Code';
import { Notice } from '@/components/ui/Notice';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import type { LineageChange, previewParentage } from '@/shared/lineage/contract';

/** What other parents would change downstream, before and after; and which sheets in force say otherwise. */
export function WhatChanges({ told: { changes, sheets, doubts } }: { told: z.output<typeof previewParentage.output> }) {
  return (
    <Section title="What it changes" aside={String(changes.length)}>
      {sheets.length > 0 ? (
        <Notice
          tone="look"
          title={`${sheets.length} ${sheets.length === 1 ? 'sheet' : 'sheets'} already issued may say otherwise`}
          words={sheets.map(({ number }) => number).join(', ')}
        />
      ) : null}
      {doubts.map((words) => (
        <Notice key={words} tone="look" title="This cannot be right" words={words} />
      ))}
      {changes.length === 0 ? <Text tone="soft">No F, generation or known pedigree changes.</Text> : null}
      <Rows>
        {changes.map((change) => (
          <Row
            key={change.id}
            title={change.code ? <Code>{change.code}</Code> : `A ${change.thing} without a code`}
            note={differencesOf(change)}
          />
        ))}
      </Rows>
    </Section>
  );
}

function differencesOf({ before, after }: LineageChange): string {
  const pairs = [
    ['F', before.f.toFixed(3), after.f.toFixed(3)],
    ['Generation', generationOf(before.generation), generationOf(after.generation)],
    ['Generations known', before.known.toFixed(2), after.known.toFixed(2)],
  ] as const;
  return pairs.flatMap(([what, was, now]) => (was === now ? [] : [`${what} ${was} → ${now}`])).join(' · ');
}

const generationOf = (range: LineageChange['before']['generation']): string =>
  !range ? 'not known' : range.low === range.high ? `F${range.low}` : `F${range.low} to F${range.high}`;
