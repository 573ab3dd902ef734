import type { Block } from '../print/flow';
import { METRIC, type UnitChoices } from '../units';
import type { SheetContent } from './content';
import { growthBlock, growthSide, NO_LENGTHS } from './growthBlock';
import { headBlock } from './headBlock';
import { identityBlock } from './identityBlock';
import { plain, type Setting, sectionHead, sideBySide, smallText, textBlock } from './parts';
import { pedigreeBlock } from './pedigreeBlock';
import { cautionsBlock, knownRows, treatmentRows } from './recordBlocks';
import { waterRows, waterSide } from './waterBlock';

export type SheetOptions = {
  /** The address of the sheet's public check page: in print and in the square code. */
  checkUrl: string;
  /** Units of the person the sheet is for; metric unless said. */
  units?: UnitChoices;
  /** Whether the painter has the photo that the content names. Without it nothing is said of one. */
  hasPicture: boolean;
};

const COLUMN_MM = 81;
const GUTTER_MM = 7.4;

/** A sheet in three parts: who the fish are, what was recorded of them, what to mind. */
export type Sections = { family: Block[]; record: Block[]; cautions: Block[] };

export function sectionsOf(content: SheetContent, widthMm: number, setting: Setting, options: SheetOptions): Sections {
  const section = (title: string, side: string, blocks: Block[]): Block[] =>
    blocks.length > 0 ? [sectionHead(title, side, widthMm, setting), ...blocks] : [];
  const { treatments, known, cautions } = content;
  const shapes = 'square male, circle female, diamond not sexed';
  return {
    family: [
      headBlock(content, widthMm),
      identityBlock(content, widthMm, setting, options.hasPicture),
      ...section('Treatment running', '', treatmentRows(treatments, widthMm, setting)),
      ...section('Parents and grandparents', shapes, [pedigreeBlock(content, widthMm, setting)]),
    ],
    record: [
      husbandryBlock(content, widthMm, setting, options.units ?? METRIC),
      ...section('What is known, and how', '', knownRows(known, widthMm, setting)),
    ],
    cautions: section('Cautions', '', cautions.length > 0 ? [cautionsBlock(cautions, widthMm, setting)] : []),
  };
}

function husbandryBlock({ growth, water }: SheetContent, widthMm: number, setting: Setting, units: UnitChoices): Block {
  const left = widthMm - COLUMN_MM - GUTTER_MM;
  const missing = (text: string, width: number) => textBlock(smallText(plain(text), width), 2);
  return sideBySide(
    [
      {
        x: 0,
        blocks: [
          sectionHead('Growth', growth ? growthSide(growth, units) : '', left, setting),
          growth ? growthBlock(growth, left, setting, units) : missing(NO_LENGTHS, left),
        ],
      },
      {
        x: left + GUTTER_MM,
        blocks: [
          sectionHead('Water kept in', water ? waterSide(water) : '', COLUMN_MM, setting),
          ...(water
            ? waterRows(water, COLUMN_MM, setting, units)
            : [missing('No water tests are recorded.', COLUMN_MM)]),
        ],
      },
    ],
    setting,
  );
}
