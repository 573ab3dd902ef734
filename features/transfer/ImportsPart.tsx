import { useQuery } from '@tanstack/react-query';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { useRoom } from '@/hooks/useRoom';
import { dayOf, formatDate } from '@/shared/days';
import { importsQuery, useImports } from './csvQueries';
import { KIND_WORDS } from './kindWords';

/** What came in before, each to be taken back as a whole. */
export function ImportsPart() {
  const room = useRoom();
  const { data } = useQuery(importsQuery(room.id));
  const { undo } = useImports(room.id);
  if (!data || data.imports.length === 0) return null;
  return (
    <Section title="Brought in before" aside={String(data.imports.length)}>
      {undo.error ? <Notice tone="act" alert title="Not taken back" words={undo.error.message} /> : null}
      <Rows>
        {data.imports.map(({ id, kind, fileName, rows, createdAt, undoneAt }) => (
          <Row
            key={id}
            figure={String(rows)}
            unit={rows === 1 ? 'line' : 'lines'}
            title={fileName}
            note={`${KIND_WORDS[kind].word}, ${formatDate(dayOf(Date.parse(createdAt), room.timeZone))}`}
            state={undoneAt ? 'taken back' : undefined}
            action={
              undoneAt ? undefined : (
                <Button
                  kind="text"
                  small
                  label="Take back"
                  describe={`Take back ${fileName}`}
                  busy={undo.isPending && undo.variables === id}
                  busyLabel="Taking back"
                  onPress={() => undo.mutate(id)}
                />
              )
            }
          />
        ))}
      </Rows>
    </Section>
  );
}
