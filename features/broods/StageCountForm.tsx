import { View } from 'react-native';
import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { NumberField } from '@/components/form/NumberField';
import { TextField } from '@/components/form/TextField';
import { space } from '@/components/theme/space';
import { Beside } from '@/features/entries/Beside';
import { EntryPage } from '@/features/entries/EntryPage';
import { NoteDraft } from '@/features/entries/note';
import { Part } from '@/features/entries/Part';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import type { BatchTold } from '@/shared/broods/contract';
import { DayText } from '@/shared/days';
import { HeadsOrNone } from '@/shared/shapes';
import { orBlank, spelledHeads } from '@/shared/spelled';
import { BatchLine } from './BatchLine';
import { InBatch } from './InBatch';
import type { BatchesOf } from './useBatches';

const Count = orBlank(spelledHeads(HeadsOrNone));
const Draft = z
  .strictObject({
    eggs: Count,
    wrigglers: Count,
    freeSwimming: Count,
    dead: Count,
    deformed: Count,
    onDay: DayText,
    note: NoteDraft,
  })
  .check(
    z.refine(
      ({ eggs, wrigglers, freeSwimming, dead, deformed }) =>
        [eggs, wrigglers, freeSwimming, dead, deformed].some((count) => count !== null),
      {
        error: 'Type at least one count',
        path: ['eggs'],
      },
    ),
  );

/** Eggs, wrigglers, free-swimming, dead and deformed: what the tumbler shows. */
export function StageCountForm(of: BatchesOf) {
  return (
    <InBatch title="Eggs and wrigglers" form="stage-count" of={of}>
      {(batch) => <Fields key={batch.id} batch={batch} />}
    </InBatch>
  );
}

function Fields({ batch }: { batch: BatchTold }) {
  const { today } = useRoom();
  const broodId = batch.sources[0]?.broodId ?? '';
  const entry = useEntryForm({
    title: 'Eggs and wrigglers',
    draft: `stageCount:${broodId}`,
    schema: Draft,
    start: { eggs: '', wrigglers: '', freeSwimming: '', dead: '', deformed: '', onDay: today, note: '' },
    content: ({ onDay, note, ...numbers }) => ({
      kind: 'stageCount',
      broodId,
      onDay,
      note,
      numbers: { total: null, ...numbers },
    }),
  });
  return (
    <EntryPage entry={entry} subtitle={<BatchLine batch={batch} />} saveLabel="Save count">
      <Part title="How many?" aside="empty if not counted">
        <View style={{ gap: space[4] }}>
          <Beside>
            <NumberField name="eggs" label="Eggs" whole />
            <NumberField name="wrigglers" label="Wrigglers" whole />
            <NumberField name="freeSwimming" label="Swimming" whole />
          </Beside>
          <Beside>
            <NumberField name="dead" label="Dead" whole />
            <NumberField name="deformed" label="Deformed" whole />
          </Beside>
        </View>
      </Part>
      <Part title="When">
        <DateField name="onDay" label="When" quiet today={today} />
      </Part>
      <TextField name="note" label="Note" aside="not needed" long />
    </EntryPage>
  );
}
