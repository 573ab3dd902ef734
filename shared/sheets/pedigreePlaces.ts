import { type Paragraph, paragraph, type Span } from '../print/lines';
import type { KinSlot } from './kin';
import { plain, type Setting, TYPE } from './parts';
import { joinOr } from './sayings';

/** Columns, from the left edge: the shape's centre, where its label starts, how wide that may grow. */
export const COLUMNS = {
  subject: { shape: 4.5, label: 10, width: 28 },
  parent: { shape: 52, label: 57.5, width: 46 },
  grandparent: { shape: 123, label: 128.5 },
} as const;
export const SHAPE_MM = 5;

/** A slot with its label set, as tall as both need. */
export type Place = { slot: KinSlot; label: Paragraph; heightMm: number };
/** A parent with its own parents. */
export type Branch = { parent: Place; of: Place[] };

export const codeSpans = (codes: string[]): Span[] =>
  codes.flatMap((code, i): Span[] => [
    ...(i > 0 ? [{ text: ' or ', face: 'regular' as const }] : []),
    { text: code, face: 'code' },
  ]);

/** A title with its notes under it. */
export function labelOf(title: Span[], notes: string[], widthMm: number): Paragraph {
  const head = paragraph(title, widthMm, { sizeMm: TYPE.body, lineMm: 4.5 });
  const foot = paragraph(plain(notes.join(' · ')), widthMm, { sizeMm: 3.17, lineMm: 4, ink: 'ink2' });
  return {
    heightMm: head.heightMm + foot.heightMm,
    widthMm: Math.max(head.widthMm, foot.widthMm),
    marks: (x, y) => [...head.marks(x, y), ...foot.marks(x, y + head.heightMm)],
  };
}

function placeOf(slot: KinSlot, widthMm: number, setting: Setting): Place {
  const title: Span[] = slot.codes.length > 0 ? codeSpans(slot.codes) : plain(slot.otherwise);
  const of =
    setting.told && slot.parents.length > 0
      ? [`of ${slot.parents.map((p) => joinOr(p.codes) || p.otherwise).join(' and ')}`]
      : [];
  const label = labelOf(title, [...slot.notes, ...of], widthMm);
  return { slot, label, heightMm: Math.max(SHAPE_MM, label.heightMm) + setting.slotMm };
}

/** Parents with their own, measured. */
export function branchesOf(slots: KinSlot[], widthMm: number, setting: Setting): Branch[] {
  const near = setting.told ? widthMm - COLUMNS.parent.label : COLUMNS.parent.width;
  const far = widthMm - COLUMNS.grandparent.label;
  return slots.map((slot) => ({
    parent: placeOf(slot, near, setting),
    of: setting.told ? [] : slot.parents.map((each) => placeOf(each, far, setting)),
  }));
}

/** How many places a branch takes up side by side with the others. */
export const placesIn = (branch: Branch): number => Math.max(1, branch.of.length);
export const sumOf = (places: Place[]): number => places.reduce((sum, place) => sum + place.heightMm, 0);
export const heightOfBranch = (branch: Branch): number => Math.max(branch.parent.heightMm, sumOf(branch.of));
