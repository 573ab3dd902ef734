import { type Href, useRouter } from 'expo-router';
import { useState } from 'react';
import { IconButton } from '@/components/ui/IconButton';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { draftsOf, dropDraft } from '@/features/entries/drafts';
import { useRoom } from '@/hooks/useRoom';
import { dayOf, fromToday } from '@/shared/days';

const SHOWN = 3;

/** What was begun on this device and not saved: gone on with, or thrown away. */
export function DraftRows({ onGone }: { onGone: () => void }) {
  const room = useRoom();
  const router = useRouter();
  const [drafts, setDrafts] = useState(() => draftsOf(room));
  if (drafts.length === 0) return null;
  return (
    <Rows open label="Drafts">
      {drafts.slice(0, SHOWN).map(({ key, title, href, at }) => (
        <Row
          key={key}
          onPress={() => {
            onGone();
            router.push(href as Href); // an address of this app: the page that wrote the draft
          }}
          label={`Go on with the draft: ${title}`}
          title={`Draft: ${title}`}
          note={`Begun ${fromToday(dayOf(Date.parse(at), room.timeZone), room.today)}, not saved`}
          middle
          action={
            <IconButton
              icon="remove"
              label={`Throw the draft away: ${title}`}
              onPress={() => {
                dropDraft(key);
                setDrafts(draftsOf(room));
              }}
            />
          }
        />
      ))}
    </Rows>
  );
}
