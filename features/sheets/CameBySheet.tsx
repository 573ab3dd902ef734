import { useQuery } from '@tanstack/react-query';
import { LinkRow } from '@/components/ui/LinkRow';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { useRoom } from '@/hooks/useRoom';
import { formatDate } from '@/shared/days';
import { trustWords } from '@/shared/sheets/importWords';
import { importedListQuery } from './importQueries';

/** On a fish's page and in its lineage: the sheet that it came with or is told of by, and whether that was checked. */
export function CameBySheet({ fishId }: { fishId: string }) {
  const room = useRoom();
  const { data = [] } = useQuery(importedListQuery(room.id, fishId));
  if (data.length === 0) return null;
  return (
    <Section title="Told by a sheet of another fishroom">
      <Rows bleed>
        {data.map((sheet) => (
          <LinkRow
            key={sheet.id}
            title={`${sheet.number}, ${sheet.room}`}
            value={trustWords(sheet).word}
            note={`Issued ${formatDate(sheet.issuedOn)}, taken in ${formatDate(sheet.takenInOn)}`}
            href={`/r/${room.id}/sheets/imported/${sheet.id}`}
          />
        ))}
      </Rows>
    </Section>
  );
}
