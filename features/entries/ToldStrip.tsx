import { useMutation } from '@tanstack/react-query';
import { type Href, useRouter } from 'expo-router';
import { use, useEffect } from 'react';
import { View } from 'react-native';
import { UndoStrip } from '@/components/ui/UndoStrip';
import { type Told, ToldContext, useUndo } from '@/features/entries';
import { ENTRY_LOOKS } from './looks';
import { WordStrip } from './WordStrip';

/** Right above the bottom bar, on whatever page: the last record with Undo for ten minutes, or a draft to go on with. */
export function ToldStrip() {
  const { told } = use(ToldContext);
  if (told === null) return null;
  return (
    <View role="region" aria-label="Last record">
      <Strip />
    </View>
  );
}

function Strip() {
  const { told, tell } = use(ToldContext);
  const router = useRouter();
  if (told === null) return null;
  if (told.is === 'draft') {
    const goOn = () => {
      tell(null);
      router.push(told.href as Href); // an address of this app: the page that wrote the draft
    };
    return (
      <WordStrip
        words={`Draft kept: ${told.title}`}
        icon="note"
        action={{ label: 'Go on', describe: `Go on with ${told.title}`, onPress: goOn }}
        onDismiss={() => tell(null)}
      />
    );
  }
  if (told.is === 'settled') return <SettledStrip key={told.key} told={told} hide={() => tell(null)} />;
  return <KeptStrip key={told.entryId} told={told} hide={() => tell(null)} />;
}

type Kept = Extract<Told, { is: 'kept' }>;

function KeptStrip({ told, hide }: { told: Kept; hide: () => void }) {
  const undo = useMutation({ mutationFn: useUndo() });
  const { entryId, kind, line, undoUntil } = told;
  const { word, icon } = ENTRY_LOOKS[kind];
  const what = line?.said ?? word;
  useEffect(() => {
    const left = Date.parse(undoUntil) - Date.now();
    const timer = setTimeout(hide, Math.max(0, left));
    return () => clearTimeout(timer);
  }, [undoUntil, hide]);
  if (undo.isSuccess) return <WordStrip words={`Undone: ${what}`} icon="undo" onDismiss={hide} />;
  if (undo.isError) return <WordStrip words={undo.error.message} icon="warn" onDismiss={hide} />;
  return (
    <UndoStrip
      words={line ? `${what}. Saved.` : `${what}. Waits here for a signal.`}
      icon={icon}
      undoLabel={`Undo ${what}`}
      busy={undo.isPending}
      onUndo={() => undo.mutate(entryId)}
      onDismiss={hide}
    />
  );
}

type Settled = Extract<Told, { is: 'settled' }>;

/** A task was done, skipped or put off; it comes back as it was. */
function SettledStrip({ told: { words, bringBack }, hide }: { told: Settled; hide: () => void }) {
  const back = useMutation({ mutationFn: bringBack });
  if (back.isSuccess) return <WordStrip words="It is open again." icon="undo" onDismiss={hide} />;
  if (back.isError) return <WordStrip words={back.error.message} icon="warn" onDismiss={hide} />;
  return (
    <UndoStrip
      words={words}
      icon="tick"
      undoLabel={`Undo: ${words}`}
      busy={back.isPending}
      onUndo={() => back.mutate()}
      onDismiss={hide}
    />
  );
}
