import { EntryContent } from '@/shared/record/kinds';
import type { Waiting } from './waiting';

/** Ids of things that a record makes, and that later records may name: a hold, its brood, a batch, a fish. */
export function idsMadeBy(content: EntryContent): string[] {
  switch (content.kind) {
    case 'spawnSeen':
    case 'holdingSeen':
      return [content.holdId];
    case 'holdEnded':
      return content.brood ? [content.brood.broodId, content.brood.batchId] : [];
    case 'broodFound':
      return [content.broodId, content.batchId];
    case 'batchSplit':
      return [content.newBatchId];
    case 'heldBack':
      return content.fish.map(({ id }) => id);
    case 'headsKept':
      return [content.reservationId];
    case 'lengthSampled':
      return [content.sampleId];
    case 'photoTaken':
      return [content.photoId];
    case 'treatmentStarted':
    case 'quarantineStarted':
      return [content.careId];
    default:
      return [];
  }
}

type Link = Pick<Waiting, 'id' | 'dependsOn' | 'content'>;

/** Whether one record builds on another: it says so, or it names a thing that the other makes. */
export function buildsOn(later: Link, earlier: Link): boolean {
  if (later.id === earlier.id) return false;
  if (later.dependsOn.includes(earlier.id)) return true;
  const text = JSON.stringify(later.content);
  return idsMadeBy(earlier.content).some((id) => text.includes(id));
}

/** Everything that builds on a record, and on what builds on it, in the order of making. */
export function followersOf<One extends Link>(entry: Link, all: readonly One[]): One[] {
  const found: One[] = [];
  for (const one of all) {
    if (one.id !== entry.id && [entry, ...found].some((earlier) => buildsOn(one, earlier))) found.push(one);
  }
  return found;
}

/** Not to be sent now: the keeper has to look at it first, or has it open in its form. */
export const isStuck = ({ state, trouble }: Pick<Waiting, 'state' | 'trouble'>): boolean =>
  trouble !== null || state === 'editing';

/** The record that this one has to wait for, or null. `all` is in the order of making. */
export function heldBy(entry: Waiting, all: readonly Waiting[]): Waiting | null {
  const stuck = all.filter((one) => one.id !== entry.id && isStuck(one));
  return stuck.find((one) => followersOf(one, all).some(({ id }) => id === entry.id)) ?? null;
}

/** The first that may be sent: in order, past those that are stuck and what builds on them. */
export const nextToSend = (all: readonly Waiting[]): Waiting | undefined =>
  all.find((entry) => !isStuck(entry) && heldBy(entry, all) === null);

/** Names another thing instead: the hold that someone else recorded in place of one's own. */
export function renamed(content: EntryContent, ids: ReadonlyMap<string, string>): EntryContent {
  let text = JSON.stringify(content);
  for (const [from, to] of ids) text = text.replaceAll(`"${from}"`, `"${to}"`);
  return EntryContent.parse(JSON.parse(text));
}
