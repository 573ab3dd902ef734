import type { IconName } from '@/components/ui/iconMarks';
import type { HeadRow } from '@/shared/broods/headCount';
import { HEAD_KIND_WORDS, type HeadKind, LOSS_CAUSE_WORDS } from '@/shared/broods/headEntry';

export const LINE_ICONS: Record<HeadKind, IconName> = {
  opening: 'release',
  movedIn: 'move',
  returned: 'undo',
  loss: 'loss',
  cull: 'minus',
  movedOut: 'move',
  heldBack: 'heldBack',
  sold: 'buyers',
  given: 'buyers',
  traded: 'buyers',
  auctioned: 'buyers',
  recount: 'headCount',
};

/** "Loss, found dead", "Head count, 1 not found": a count's difference is a correction and not a loss. */
export function lineWords({ entry, correction }: HeadRow, tank: string | null): string {
  const at = tank ? ` · ${tank}` : '';
  if (entry.kind === 'recount') return `Head count${correctionWords(correction)}${at}`;
  if (entry.kind === 'loss') return `Loss, ${LOSS_CAUSE_WORDS[entry.cause ?? 'unknown'].toLowerCase()}${at}`;
  return `${HEAD_KIND_WORDS[entry.kind]}${at}`;
}

function correctionWords(correction: number): string {
  if (correction === 0) return '';
  return correction < 0 ? `, ${-correction} not found` : `, ${correction} more than on the books`;
}
