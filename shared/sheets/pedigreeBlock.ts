import type { Block } from '../print/flow';
import { type Paragraph, paragraph, type Span } from '../print/lines';
import type { LineMark, Mark, Point, Sex } from '../print/page';
import type { SheetContent } from './content';
import { type Kin, type KinSlot, kinOf, pairsOf } from './kin';
import { plain, type Setting, smallText, TYPE } from './parts';
import { drawWords, joinOr, shareWords, unbroken } from './sayings';

/** Columns, from the left edge: the shape's centre, where its label starts, how wide that may grow. */
const COLUMNS = {
  subject: { shape: 4.5, label: 10, width: 28 },
  parent: { shape: 52, label: 57.5, width: 46 },
  grandparent: { shape: 123, label: 128.5 },
} as const;
const BUSES = { parents: 42.5, grandparents: 112.5 } as const;
const SHAPE_MM = 5;
/** Free space between a line's end and the shape or label beside it. */
const CLEAR_MM = 2.2;
/** A drawing may grow by this much for each place, to fill the page. */
const STRETCH_PER_PLACE_MM = 7;
const DASH = [1.3, 1.05] as const;

type Place = { slot: KinSlot; label: Paragraph; heightMm: number };
type Branch = { parent: Place; of: Place[] };

const codeSpans = (codes: string[]): Span[] =>
  codes.flatMap((code, i): Span[] => [
    ...(i > 0 ? [{ text: ' or ', face: 'regular' as const }] : []),
    { text: code, face: 'code' },
  ]);

function labelOf(title: Span[], notes: string[], widthMm: number): Paragraph {
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

function branchesOf(kin: Kin, widthMm: number, setting: Setting): Branch[] {
  const near = setting.told ? widthMm - COLUMNS.parent.label : COLUMNS.parent.width;
  const far = widthMm - COLUMNS.grandparent.label;
  return kin.parents.map((slot) => ({
    parent: placeOf(slot, near, setting),
    of: setting.told ? [] : slot.parents.map((each) => placeOf(each, far, setting)),
  }));
}

const placesIn = (branch: Branch): number => Math.max(1, branch.of.length);
const sumOf = (places: Place[]): number => places.reduce((sum, place) => sum + place.heightMm, 0);
const heightOfBranch = (branch: Branch): number => Math.max(branch.parent.heightMm, sumOf(branch.of));

/** A line for a known parent; thinner and dashed the less likely it is. */
function branchLine(points: Point[], slot: KinSlot): LineMark {
  if (slot.sure) return { kind: 'line', points, widthMm: 0.33, ink: 'ink' };
  return { kind: 'line', points, widthMm: 0.2 + 0.25 * slot.share, ink: 'ink', dashMm: DASH };
}

const sexOf = (slot: KinSlot): Sex => (slot.role === 'sire' ? 'male' : 'female');

function placeMarks(place: Place, column: { shape: number; label: number }, x: number, y: number): Mark[] {
  return [
    {
      kind: 'shape',
      x: x + column.shape,
      y,
      sizeMm: SHAPE_MM,
      sex: sexOf(place.slot),
      sure: place.slot.sure,
      filled: false,
    },
    ...place.label.marks(x + column.label, y - place.label.heightMm / 2),
  ];
}

/** Lines from one animal over a bus to the shapes of its parents. */
function fan(from: { x: number; y: number; bus: number; to: number }, ends: { y: number; slot: KinSlot }[]): Mark[] {
  if (ends.length === 0) return [];
  const stem: LineMark = {
    kind: 'line',
    points: [
      [from.x, from.y],
      [from.bus, from.y],
    ],
    widthMm: 0.33,
    ink: 'ink',
  };
  const lines = ends.map(({ y, slot }) =>
    branchLine(
      [
        [from.bus, from.y],
        [from.bus, y],
        [from.to, y],
      ],
      slot,
    ),
  );
  return [stem, ...lines.sort((a, b) => Number(b.dashMm !== undefined) - Number(a.dashMm !== undefined))];
}

function subjectSex({ heads, kind }: SheetContent['subject']): Sex {
  if (kind === 'brood') return 'unsexed';
  return heads.male > 0 ? 'male' : heads.female > 0 ? 'female' : 'unsexed';
}

/** Parents and grandparents: shapes, codes, what is dashed. It takes up the room that a page has left. */
export function pedigreeBlock(content: SheetContent, widthMm: number, setting: Setting): Block {
  const kin = kinOf(content.ancestry, content.subject.id);
  const branches = branchesOf(kin, widthMm, setting);
  const places = branches.reduce((sum, branch) => sum + placesIn(branch), 0);
  const subject = labelOf(codeSpans([content.subject.code]), [], COLUMNS.subject.width);
  const notes = smallText(plain(notesOf(content, kin).join(' ')), widthMm);
  const tree = Math.max(
    subject.heightMm + setting.slotMm,
    branches.reduce((sum, branch) => sum + heightOfBranch(branch), 0),
  );
  return {
    heightMm: 1.5 + tree + 1 + notes.heightMm,
    stretchMm: places * STRETCH_PER_PLACE_MM,
    marks: (x, y, extraMm) => [
      ...treeMarks(
        { content, branches, subject },
        { x, y: y + 1.5, heightMm: tree + extraMm, extraMm: extraMm / places },
      ),
      ...notes.marks(x, y + 2.5 + tree + extraMm),
    ],
  };
}

type Tree = { content: SheetContent; branches: Branch[]; subject: Paragraph };

function treeMarks(
  { content, branches, subject }: Tree,
  at: { x: number; y: number; heightMm: number; extraMm: number },
): Mark[] {
  const reach = Math.max(0, ...branches.map(({ parent }) => parent.label.widthMm));
  let top = at.y;
  const drawn = branches.map((branch) => {
    const room = heightOfBranch(branch) + placesIn(branch) * at.extraMm;
    const spare = (room - sumOf(branch.of)) / placesIn(branch);
    let y = top;
    const of = branch.of.map((place) => {
      const centre = y + (place.heightMm + spare) / 2;
      y += place.heightMm + spare;
      return { y: centre, place };
    });
    const centre = of.length > 0 ? ((of[0]?.y ?? 0) + (of.at(-1)?.y ?? 0)) / 2 : top + room / 2;
    top += room;
    return { y: centre, branch, of };
  });
  const own = drawn.length > 0 ? ((drawn[0]?.y ?? 0) + (drawn.at(-1)?.y ?? 0)) / 2 : at.y + at.heightMm / 2;
  const { x } = at;
  const { heads, sexSure } = content.subject;
  return [
    ...fan(
      {
        x: x + COLUMNS.subject.label + subject.widthMm + CLEAR_MM,
        y: own,
        bus: x + BUSES.parents,
        to: x + COLUMNS.parent.shape - SHAPE_MM / 2 - CLEAR_MM,
      },
      drawn.map(({ y, branch }) => ({ y, slot: branch.parent.slot })),
    ),
    {
      kind: 'shape',
      x: x + COLUMNS.subject.shape,
      y: own,
      sizeMm: SHAPE_MM + 1,
      sex: subjectSex(content.subject),
      sure: sexSure || heads.unsexed > 0,
      filled: true,
    },
    ...subject.marks(x + COLUMNS.subject.label, own - subject.heightMm / 2),
    ...drawn.flatMap(({ y, branch, of }) => [
      ...fan(
        {
          x: x + COLUMNS.parent.label + reach + CLEAR_MM,
          y,
          bus: x + BUSES.grandparents,
          to: x + COLUMNS.grandparent.shape - SHAPE_MM / 2 - CLEAR_MM,
        },
        of.map((each) => ({ y: each.y, slot: each.place.slot })),
      ),
      ...placeMarks(branch.parent, COLUMNS.parent, x, y),
      ...of.flatMap((each) => placeMarks(each.place, COLUMNS.grandparent, x, each.y)),
    ]),
  ];
}

function notesOf(content: SheetContent, kin: Kin): string[] {
  const subject = content.ancestry.find(({ id }) => id === content.subject.id);
  if (kin.parents.length === 0)
    return [subject?.origin === 'wild' ? 'Wild caught: no parents are known.' : 'No parents are recorded.'];
  const unsure = kin.parents.some((slot) => !slot.sure || slot.parents.some((each) => !each.sure));
  const draws = subject && 'sire' in subject ? [drawWords(subject.sire, 'sire'), drawWords(subject.dam, 'dam')] : [];
  const pairs = pairsOf(content.ancestry, content.subject.id).map(
    ({ sires, dams, share }) => `${joinOr(sires)} with ${joinOr(dams)} ${shareWords(share)}`,
  );
  return [
    ...(unsure ? ['Dashed: not certain.'] : []),
    ...draws.flatMap((text) => text ?? []),
    ...(pairs.length > 0 ? [`Fish of several pairs: ${pairs.join('; ')}.`] : []),
    ...(kin.furtherBack > 0 ? [`${unbroken(`${kin.furtherBack} known`)} further back, in the sheet’s file.`] : []),
  ];
}
