import { useMutation, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { IconButton } from '@/components/ui/IconButton';
import { LedgerRow } from '@/components/ui/LedgerRow';
import { Notice } from '@/components/ui/Notice';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { call } from '@/features/call';
import { useUndo } from '@/features/entries';
import { ENTRY_LOOKS } from '@/features/entries/looks';
import { useRoom } from '@/hooks/useRoom';
import { formatDate, formatShortDay } from '@/shared/days';
import { type About, type EntryLine, listEntries } from '@/shared/record/contract';
import { may } from '@/shared/roles';

type Props = About & {
  /** "Log" on a hold's page. */
  title?: string;
};

const SHOWN = 12;
const MOST = 500;

/** What was recorded about a thing, newest first; one's own records can be undone here for ten minutes. */
export function History({ thing, id, title = 'Log' }: Props) {
  const { id: roomId } = useRoom();
  const [all, setAll] = useState(false);
  const undo = useMutation({ mutationFn: useUndo() });
  const { data, error } = useQuery({
    queryKey: [roomId, 'record', 'history', thing, id],
    queryFn: ({ signal }) =>
      call(listEntries, { params: { roomId }, query: { thing, thingId: id, limit: String(MOST) }, signal }),
    select: ({ entries }) => entries,
  });
  const shown = all ? data : data?.slice(0, SHOWN);
  return (
    <Section title={title} aside={data ? String(data.length) : undefined}>
      {error ? <Notice tone="look" words={error.message} /> : null}
      {undo.error ? <Notice tone="act" alert words={undo.error.message} /> : null}
      {shown && shown.length === 0 ? <Text tone="soft">Nothing recorded yet.</Text> : null}
      {shown ? (
        <Rows>
          {shown.map((line) => (
            <HistoryLine key={line.id} line={line} onUndo={() => undo.mutate(line.id)} />
          ))}
        </Rows>
      ) : null}
      {data && shown && data.length > shown.length ? (
        <TextLink label={`Show ${data.length - shown.length} more`} onPress={() => setAll(true)} />
      ) : null}
    </Section>
  );
}

function HistoryLine({ line, onUndo }: { line: EntryLine; onUndo: () => void }) {
  const room = useRoom();
  const { kind, onDay, said, by, undone } = line;
  const icon = Object.entries(ENTRY_LOOKS).find(([name]) => name === kind)?.[1].icon;
  const mine = by.id === room.accountId || may(room.role, 'entry:correct');
  const canUndo = !undone && mine && Date.parse(line.undoUntil) > Date.now();
  return (
    <LedgerRow
      date={onDay.slice(0, 4) === room.today.slice(0, 4) ? formatShortDay(onDay) : formatDate(onDay)}
      {...(icon ? { icon } : {})}
      event={said}
      by={undone ? `undone, ${undone.by}` : by.name}
      corrected={undone !== null}
      action={canUndo ? <IconButton icon="undo" label={`Undo ${said}`} onPress={onUndo} /> : undefined}
    />
  );
}
