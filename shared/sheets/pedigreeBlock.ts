import type { Block } from '../print/flow';
import type { Paragraph } from '../print/lines';
import type { LineMark, Mark, Point, Sex } from '../print/page';
import type { SheetContent } from './content';
import { type Kin, type KinSlot, kinOf, pairsBehind } from './kin';
import { plain, type Setting, smallText } from './parts';
import {
  type Branch,
  branchesOf,
  COLUMNS,
  codeSpans,
  heightOfBranch,
  labelOf,
  type Place,
  placesIn,
  SHAPE_MM,
  sumOf,
} from './pedigreePlaces';
import { drawWords, joinOr, shareWords, unbroken } from './sayings';

const BUSES = { parents: 42.5, grandparents: 112.5 } as const;
/** Free space between a line's end and the shape or label beside it. */
const CLEAR_MM = 2.2;
/** A drawing may grow by this much for each place, to fill the page. */
const STRETCH_PER_PLACE_MM = 7;
const DASH = [1.3, 1.05] as const;

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
  const branches = branchesOf(kin.parents, widthMm, setting);
  const places = branches.reduce((sum, branch) => sum + placesIn(branch), 0);
  const label = labelOf(codeSpans([content.subject.code]), [], COLUMNS.subject.width);
  const notes = smallText(plain(notesOf(content, kin).join(' ')), widthMm);
  const tree = Math.max(
    label.heightMm + setting.slotMm,
    branches.reduce((sum, branch) => sum + heightOfBranch(branch), 0),
  );
  return {
    heightMm: 1.5 + tree + 1 + notes.heightMm,
    stretchMm: places * STRETCH_PER_PLACE_MM,
    marks: (x, y, extraMm) => [
      ...treeMarks(
        { subject: content.subject, branches, label },
        { x, y: y + 1.5, heightMm: tree + extraMm, extraMm: places > 0 ? extraMm / places : 0 },
      ),
      ...notes.marks(x, y + 2.5 + tree + extraMm),
    ],
  };
}

type Tree = { subject: SheetContent['subject']; branches: Branch[]; label: Paragraph };
type Spot = { x: number; y: number; heightMm: number; extraMm: number };

/** A branch with the heights its shapes stand at. */
type Drawn = { y: number; branch: Branch; of: { y: number; place: Place }[] };

const middle = (list: { y: number }[], otherwise: number): number =>
  list.length > 0 ? ((list[0]?.y ?? 0) + (list.at(-1)?.y ?? 0)) / 2 : otherwise;

/** Hangs a branch below `top`; its places share the extra room evenly, and the parent stands midway between its own. */
function hang(branch: Branch, top: number, roomMm: number): Drawn {
  const spare = (roomMm - sumOf(branch.of)) / placesIn(branch);
  let y = top;
  const of = branch.of.map((place) => {
    const centre = y + (place.heightMm + spare) / 2;
    y += place.heightMm + spare;
    return { y: centre, place };
  });
  return { y: middle(of, top + roomMm / 2), branch, of };
}

function hangAll(branches: Branch[], { y, extraMm }: Spot): Drawn[] {
  let top = y;
  return branches.map((branch) => {
    const room = heightOfBranch(branch) + placesIn(branch) * extraMm;
    const drawn = hang(branch, top, room);
    top += room;
    return drawn;
  });
}

const edgeOf = (column: { shape: number }): number => column.shape - SHAPE_MM / 2 - CLEAR_MM;

function treeMarks({ subject, branches, label }: Tree, at: Spot): Mark[] {
  const { x } = at;
  const drawn = hangAll(branches, at);
  const y = middle(drawn, at.y + at.heightMm / 2);
  const reach = Math.max(0, ...branches.map(({ parent }) => parent.label.widthMm));
  const stem = x + COLUMNS.subject.label + label.widthMm + CLEAR_MM;
  const ends = drawn.map((each) => ({ y: each.y, slot: each.branch.parent.slot }));
  return [
    ...fan({ x: stem, y, bus: x + BUSES.parents, to: x + edgeOf(COLUMNS.parent) }, ends),
    {
      kind: 'shape',
      x: x + COLUMNS.subject.shape,
      y,
      sizeMm: SHAPE_MM + 1,
      sex: subjectSex(subject),
      sure: subject.sexSure || subject.heads.unsexed > 0,
      filled: true,
    },
    ...label.marks(x + COLUMNS.subject.label, y - label.heightMm / 2),
    ...drawn.flatMap((each) => branchMarks(each, x, reach)),
  ];
}

function branchMarks({ y, branch, of }: Drawn, x: number, reach: number): Mark[] {
  const stem = x + COLUMNS.parent.label + reach + CLEAR_MM;
  const ends = of.map((each) => ({ y: each.y, slot: each.place.slot }));
  return [
    ...fan({ x: stem, y, bus: x + BUSES.grandparents, to: x + edgeOf(COLUMNS.grandparent) }, ends),
    ...placeMarks(branch.parent, COLUMNS.parent, x, y),
    ...of.flatMap((each) => placeMarks(each.place, COLUMNS.grandparent, x, each.y)),
  ];
}

function notesOf(content: SheetContent, kin: Kin): string[] {
  const subject = content.ancestry.find(({ id }) => id === content.subject.id);
  if (kin.parents.length === 0)
    return [subject?.origin === 'wild' ? 'Wild caught: no parents are known.' : 'No parents are recorded.'];
  const unsure = kin.parents.some((slot) => !slot.sure || slot.parents.some((each) => !each.sure));
  const draws = subject && 'sire' in subject ? [drawWords(subject.sire, 'sire'), drawWords(subject.dam, 'dam')] : [];
  const pairs = pairsBehind(content.ancestry, content.subject.id).map(
    ({ sires, dams, share }) => `${joinOr(sires)} with ${joinOr(dams)} ${shareWords(share)}`,
  );
  return [
    ...(unsure ? ['Dashed: not certain.'] : []),
    ...draws.flatMap((text) => text ?? []),
    ...(pairs.length > 0 ? [`Fish of several pairs: ${pairs.join('; ')}.`] : []),
    ...(kin.furtherBack > 0 ? [`${unbroken(`${kin.furtherBack} known`)} further back, in the sheet’s file.`] : []),
  ];
}
