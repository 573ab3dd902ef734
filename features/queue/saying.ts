import { ENTRY_LOOKS } from '@/features/entries/looks';
import { type Day, dayWords } from '@/shared/days';
import { CHECK_WORDS, OUTCOME_WORDS } from '@/shared/holds/entries';
import type { EntryContent } from '@/shared/record/kinds';

/** The day that a record is about; null where the picture says it. */
export function dayIn(content: EntryContent): Day | null {
  if (content.kind === 'holdingSeen') return content.firstSeenOn;
  return content.kind === 'photoTaken' ? content.takenOn : content.onDay;
}

/** "Loss, 2": the kind, and the number that matters. */
export function titleOf(content: EntryContent): string {
  const { word } = ENTRY_LOOKS[content.kind];
  switch (content.kind) {
    case 'headsLost':
    case 'headsCulled':
    case 'headCounted':
    case 'headsOpened':
    case 'headsLeft':
    case 'headsKept':
    case 'batchSplit':
    case 'batchJoined':
      return `${word}, ${content.heads}`;
    case 'heldBack':
      return `${word}, ${content.fish.length}`;
    case 'waterChanged':
      return `${word}, ${content.percent} %`;
    case 'lengthSampled':
      return `${word}, ${content.readings.length} fish`;
    case 'holdEnded':
      return OUTCOME_WORDS[content.outcome];
    case 'holdCheck':
      return `${word}: ${CHECK_WORDS[content.seen].toLowerCase()}`;
    case 'treatmentStarted':
    case 'incident':
      return `${word}: ${content.what}`;
    default:
      return word;
  }
}

/** What a record is about, the thing itself before the place. */
export function subjectsOf(content: EntryContent): string[] {
  switch (content.kind) {
    case 'spawnSeen':
    case 'holdingSeen':
      return content.holderId ? [content.holderId, content.tankId] : [content.tankId];
    case 'holdCheck':
    case 'holdPlanned':
    case 'holdCorrected':
    case 'holdEnded':
      return [content.holdId];
    case 'stageCount':
    case 'broodFound':
    case 'headsKept':
      return [content.broodId];
    case 'batchJoined':
      return [content.batchId, content.intoBatchId];
    case 'batchSplit':
      return [content.batchId, content.toTankId];
    case 'moved':
      return [content.id, content.toTankId];
    case 'lengthSampled':
    case 'photoTaken':
      return [content.of.id];
    case 'incident':
      return content.tankIds.slice(0, 3);
    default:
      return 'tankId' in content && content.tankId ? [content.tankId] : stockOf(content);
  }
}

const stockOf = (content: EntryContent): string[] => {
  if ('batchId' in content && content.batchId) return [content.batchId];
  return 'fishId' in content ? [content.fishId] : [];
};

/** "6 readings", "3.1 MB", "since Tue 12 May". */
export function detailOf(content: EntryContent, bytes: number | null, today: Day): string {
  if (bytes !== null) return `${(bytes / 1e6).toFixed(1)} MB`;
  if (content.kind === 'waterTested') {
    const { celsius, ph, ghCaCo3MgL, khCaCo3MgL, totalAmmoniaNMgL, nitriteNMgL, nitrateNMgL, conductivityUs } = content;
    const read = [
      celsius,
      ph,
      ghCaCo3MgL,
      khCaCo3MgL,
      totalAmmoniaNMgL,
      nitriteNMgL,
      nitrateNMgL,
      conductivityUs,
    ].filter((value) => value !== null).length;
    return `${read} ${read === 1 ? 'reading' : 'readings'}`;
  }
  const day = dayIn(content);
  if (content.kind === 'holdingSeen') return `since ${dayWords(content.firstSeenOn, today)}`;
  return day && day !== today ? dayWords(day, today) : '';
}
