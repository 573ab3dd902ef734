import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { DateField } from '@/components/form/DateField';
import { Fields, Form } from '@/components/form/Form';
import { SelectField } from '@/components/form/Select';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Screen } from '@/components/ui/Screen';
import { call } from '@/features/call';
import { newId } from '@/features/entries';
import { residentsWords, useTanks } from '@/features/entries/tanks';
import { useLeave } from '@/features/entries/useLeave';
import { useRoom } from '@/hooks/useRoom';
import { addDays } from '@/shared/days';
import { addTask, changeTask } from '@/shared/today/contract';
import type { TaskRow } from '@/shared/today/facts';
import { membersQuery } from './queries';
import { RepeatFields } from './RepeatFields';
import { NO_TANK, NOBODY, startOf, TaskDraft } from './taskDraft';

type Props = { task: TaskRow | null; tankId?: string };

/** A task of the fishroom's own: what, when, how often, whose. */
export function TaskForm({ task, tankId }: Props) {
  const { id: roomId, today } = useRoom();
  const leave = useLeave();
  const cache = useQueryClient();
  const [id] = useState(newId);
  const save = useMutation({
    mutationFn: ({ tankId: about, ...facts }: ReturnType<typeof TaskDraft.parse>) =>
      task
        ? call(changeTask, { params: { roomId, taskId: task.id }, body: { version: task.version, ...facts } })
        : call(addTask, {
            params: { roomId },
            body: { id, ...facts, about: about ? { thing: 'tank', id: about } : null },
          }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
  const { form, notice } = useSchemaForm({
    schema: TaskDraft,
    start: startOf(task, today, tankId),
    save: async (facts) => {
      await save.mutateAsync(facts);
      leave();
    },
  });
  const title = task ? 'Change a task' : 'Add a task';
  return (
    <Form form={form} notice={notice} label={title} page>
      <Screen
        title={title}
        close={{ label: `Close ${title}`, onPress: () => leave() }}
        dock={<SubmitButton label="Save task" />}
        low
        measure
      >
        <Fields>
          <TextField name="title" label="What is to be done" needed maxLength={120} autoFocus={!task} />
          <DateField
            name="dueOn"
            label="Due on"
            today={today}
            latest={null}
            choices={[
              { word: 'Today', day: today },
              { word: 'Tomorrow', day: addDays(today, 1) },
              { word: 'In a week', day: addDays(today, 7) },
            ]}
          />
          <RepeatFields repeats={form.values.repeats} dueOn={form.values.dueOn} />
          <MemberField />
          {task ? null : <TankField />}
        </Fields>
      </Screen>
    </Form>
  );
}

function MemberField() {
  const room = useRoom();
  const { data: members = [] } = useQuery(membersQuery(room.id));
  const people = members.map(({ accountId, name }) => ({
    value: accountId,
    word: accountId === room.accountId ? `${name} (you)` : name,
  }));
  return (
    <SelectField
      name="assignedTo"
      label="Whose it is"
      options={[{ value: NOBODY, word: 'Nobody’s in particular' }, ...people]}
    />
  );
}

function TankField() {
  const { data: tanks = [] } = useTanks();
  const options = tanks.map((tank) => ({ value: tank.id, code: tank.code, word: residentsWords(tank) }));
  return (
    <SelectField
      name="tankId"
      label="Tank"
      aside="not needed"
      options={[{ value: NO_TANK, word: 'No tank in particular' }, ...options]}
    />
  );
}
