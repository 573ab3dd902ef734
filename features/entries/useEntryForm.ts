import type { Href } from 'expo-router';
import type { FormikValues } from 'formik';
import { use, useEffect, useRef, useState } from 'react';
import type * as z from 'zod/mini';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { type Kept, newId, ToldContext, useRecord } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import type { EntryContent } from '@/shared/record/kinds';
import { Refusal } from '@/shared/refusal';
import { draftKey, dropDraft, readDraft, type StoredDraft, writeDraft } from './drafts';
import { useLeave } from './useLeave';

/** Ids that the content names, made once a form: sent again after a lost answer, it is the same record. */
export type IdOf = (what: string) => string;

type Options<Value, Draft extends FormikValues> = {
  /** "Holding seen": what the page and its draft are called. */
  title: string;
  /** What the draft is of, such as `holding:<tank>`: each tank has its own. */
  draft: string;
  schema: z.core.$ZodType<Value, Draft>;
  start: Draft;
  /** `typed` is the draft itself: what a kit showed, in its own unit. */
  content: (value: Value, idOf: IdOf, typed: Draft) => EntryContent;
  odd?: (value: Value) => string | null;
  /** Where to go after; null: back to where it was opened. */
  saved?: (kept: Kept, value: Value) => Href | null;
  /** A conflict that the page shows side by side; without it the refusal stands above the button. */
  clashes?: boolean;
};

/** A Record form: draft kept on the device, one entry sent once, then back to where it was opened. */
export function useEntryForm<Value, Draft extends FormikValues>(options: Options<Value, Draft>) {
  const { title, draft, schema, start, content, odd, saved, clashes = false } = options;
  const key = draftKey(useRoom(), draft);
  const record = useRecord();
  const leave = useLeave();
  const { tell } = use(ToldContext);
  const [found, setFound] = useState<StoredDraft | null>(() => readDraft(key));
  const [clash, setClash] = useState<Refusal | null>(null);
  const once = useOnce(found?.again ?? null);
  // Saved: what is still on the screen until the page is left is no draft any more.
  const done = useRef(false);
  const entry = useSchemaForm({
    schema,
    start: found ? mergedDraft(start, found) : start,
    odd,
    save: async (value) => {
      const made = content(value, once.idOf, form.values);
      try {
        const typed = { key, title, href: here(), values: form.values, ids: once.all() };
        const kept = await record(made, { id: once.entryIdOf(made), typed });
        done.current = true;
        dropDraft(key);
        leave(saved?.(kept, value));
      } catch (error) {
        if (!clashes || !(error instanceof Refusal) || error.reason !== 'conflict' || !error.current) throw error;
        setClash(error);
      }
    },
  });
  const { form } = entry;
  useEffect(() => {
    if (!form.dirty || done.current) return;
    writeDraft(key, { values: form.values, title, href: here(), ...(found?.again ? { again: found.again } : {}) });
  }, [key, title, form.dirty, form.values, found]);
  const isKept = form.dirty || found !== null;
  return {
    ...entry,
    title,
    found,
    clash,
    settleClash: () => setClash(null),
    record: async (other: EntryContent, to?: Href | null) => {
      await record(other, { id: once.entryIdOf(other) });
      done.current = true;
      dropDraft(key);
      leave(to);
    },
    startOver: () => {
      dropDraft(key);
      setFound(null);
      form.resetForm({ values: start });
    },
    closeLabel: isKept ? `Close ${title}, keep the draft` : `Close ${title}`,
    close: () => {
      if (isKept) tell({ is: 'draft', title, href: here() });
      leave();
    },
  };
}

const here = (): string => globalThis.location.pathname + globalThis.location.search;

/** What was typed over what the form proposes now; keys that the form no longer has are left behind. */
function mergedDraft<Draft extends FormikValues>(start: Draft, { values }: StoredDraft): Draft {
  const known = Object.keys(start).filter((key) => key in values);
  return { ...start, ...Object.fromEntries(known.map((key) => [key, values[key]])) };
}

function useOnce(again: StoredDraft['again'] | null) {
  const ids = useRef(new Map<string, string>(again?.ids ?? []));
  const idOf: IdOf = (what) => {
    const known = ids.current.get(what) ?? newId();
    ids.current.set(what, known);
    return known;
  };
  return {
    idOf,
    // The same content keeps its number; once it was changed it is another entry. One that waits keeps it all the same.
    entryIdOf: (made: EntryContent) => again?.entryId ?? idOf(`entry ${JSON.stringify(made)}`),
    all: () => [...ids.current].filter(([what]) => !what.startsWith('entry ')),
  };
}
