import { useState } from 'react';
import { StyleSheet, View } from 'react-native';
import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Figure } from '@/components/ui/Figure';
import { Notice } from '@/components/ui/Notice';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import type { Offer } from '@/shared/buyers/offers';
import { promiseOf } from '@/shared/buyers/promise';
import { chosenLength, promiseWords, reachedWords, sizeRests } from '@/shared/buyers/words';
import type { SizeToday } from '@/shared/growth/sizeToday';
import { MEASURE_WORDS } from '@/shared/growth/words';
import { may } from '@/shared/roles';
import { Heads } from '@/shared/shapes';
import { spelledHeads, spelledLength } from '@/shared/spelled';
import { TENTHS_MM_PER } from '@/shared/units';
import { formatLength } from '@/shared/unitWords';

/** How long they are today, what that rests on, and whether so many of a length can be promised. */
export function SizePart({ offer }: { offer: Offer }) {
  const room = useRoom();
  const { size } = offer;
  if (!size)
    return (
      <Section title="Size today">
        <View style={styles.none}>
          <Text tone="soft">Not measured yet: what has reached a length can’t be said.</Text>
          {may(room.role, 'entry:record') ? (
            <Button
              small
              icon="lengthSample"
              label="Length sample"
              href={`/r/${room.id}/record/length-sample?brood=${offer.broodId}`}
            />
          ) : null}
        </View>
      </Section>
    );
  const sd = size.cv * size.meanTenthsMm;
  const [mean, unit] = formatLength(size.meanTenthsMm, room.units).split(' ');
  return (
    <Section title="Size today" aside={MEASURE_WORDS[size.measure]}>
      <View style={styles.size}>
        <View style={styles.figure}>
          <Figure size="m">{mean ?? ''}</Figure>
          <Text strong>{unit}</Text>
        </View>
        <View style={styles.words}>
          <Text size="small">{`Two in three between ${between(size.meanTenthsMm, sd, room.units)}.`}</Text>
          <Text size="small" tone="soft">
            {sizeRests(size, room.today)}
          </Text>
        </View>
      </View>
      <PromiseCheck size={size} available={offer.available} />
    </Section>
  );
}

type Units = ReturnType<typeof useRoom>['units'];

const between = (mean: number, sd: number, units: Units): string =>
  `${formatLength(Math.max(1, Math.round(mean - sd)), units)} and ${formatLength(Math.round(mean + sd), units)}`;

/** "Six at 5 cm now", before it is promised. */
function PromiseCheck({ size, available }: { size: SizeToday; available: number }) {
  const { units } = useRoom();
  const Wanted = z.strictObject({ heads: spelledHeads(Heads), lengthTenthsMm: spelledLength(units) });
  const [start] = useState(() => {
    const rounded = Math.max(1, Math.round(size.meanTenthsMm / TENTHS_MM_PER[units.length]));
    return { heads: '6', lengthTenthsMm: String(rounded) };
  });
  const { form } = useSchemaForm({ schema: Wanted, start, save: () => Promise.resolve() });
  const wanted = Wanted.safeParse(form.values);
  const promised = wanted.success ? promiseOf(size, available, wanted.data) : null;
  return (
    <Form form={form} notice={null} label="Can they be promised">
      <View style={styles.check}>
        <View style={styles.field}>
          <NumberField name="heads" label="Can I promise" unit="fish" whole />
        </View>
        <View style={styles.field}>
          <NumberField name="lengthTenthsMm" label="at, now" unit={units.length} />
        </View>
      </View>
      {promised && wanted.success ? (
        <Notice
          tone={promised.verdict === 'sure' ? 'tell' : promised.verdict === 'likely' ? 'look' : 'act'}
          title={promiseWords(promised, wanted.data.heads)}
          words={reachedWords(promised, available, chosenLength(wanted.data.lengthTenthsMm, units))}
        />
      ) : null}
    </Form>
  );
}

const styles = StyleSheet.create({
  none: { gap: space[3], alignItems: 'flex-start' },
  size: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space[4], marginBottom: space[4] },
  figure: { flexDirection: 'row', alignItems: 'baseline', gap: space[1] },
  words: { flexGrow: 1, flexShrink: 1, flexBasis: 200 },
  check: { flexDirection: 'row', gap: space[3] },
  field: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0 },
});
