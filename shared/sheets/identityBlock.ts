import { formatDate } from '../days';
import type { Block } from '../print/flow';
import { paragraph, type Span } from '../print/lines';
import type { Mark } from '../print/page';
import type { SheetContent } from './content';
import { bodyText, cells, plain, RULES, type Setting, sideBySide, smallText, TYPE } from './parts';
import {
  ageAtIssue,
  completenessWords,
  daysWords,
  generationWords,
  headsWords,
  inbreedingWords,
  partialDayWords,
  shareWords,
} from './sayings';
import { SOURCE_WORDS } from './sourceCodes';
import { nameSpans } from './speciesName';
import type { Founders, Locality, StrainClaim } from './strain';

const PICTURE_MM = 81;
const GUTTER_MM = 7.4;
const LABEL_MM = 30;

type Fact = { label: string; text: Span[] };
const fact = (label: string, text: string): Fact => ({ label, text: [{ text, face: 'semibold' }] });

/** What the fish are, where their line comes from, how inbred they are; with the photo beside it when there is one. */
export function identityBlock(content: SheetContent, widthMm: number, setting: Setting, hasPicture: boolean): Block {
  const shown = hasPicture ? content.photos.shown : null;
  const facts = [...factsOf(content), ...photoFacts(content.photos.count, shown !== null)];
  if (shown) {
    const width = widthMm - PICTURE_MM - GUTTER_MM;
    const left = [...nameBlocks(content.strain, width), ...factRows(facts, width, setting)];
    const right = pictureBlocks(shown, content.photos.count, setting);
    return {
      ...sideBySide(
        [
          { x: 0, blocks: left },
          { x: width + GUTTER_MM, blocks: right },
        ],
        setting,
      ),
      startsSection: false,
    };
  }
  const width = (widthMm - GUTTER_MM) / 2;
  const half = Math.ceil(facts.length / 2);
  const columns = [facts.slice(0, half), facts.slice(half)].map((list, i) => ({
    x: i * (width + GUTTER_MM),
    blocks: factRows(list, width, setting),
  }));
  const names = nameBlocks(content.strain, widthMm);
  const below = sideBySide(columns, { ...setting, gapMm: 0 });
  return { ...sideBySide([{ x: 0, blocks: [...names, below] }], setting), startsSection: false };
}

/** The name as it is known, and the place; a possible hybrid is given neither. */
function nameBlocks(strain: StrainClaim, widthMm: number): Block[] {
  if (strain.claim !== 'strain') {
    const kinds = strain.kinds.flatMap(({ scientific, locality }, i): Span[] => [
      ...(i > 0 ? plain(strain.claim === 'hybrid' ? ' with ' : ' or ') : []),
      ...nameSpans(scientific, 'plain'),
      ...(locality ? plain(` ${locality}`) : []),
    ]);
    const title = strain.claim === 'hybrid' ? 'Hybrid' : 'Possible hybrid';
    const says =
      strain.claim === 'hybrid' ? 'No strain is claimed. A cross of ' : 'No strain is claimed. A parent may be ';
    return [
      headline([{ text: title, face: 'bold' }], widthMm),
      underline([...plain(says), ...kinds, ...plain('.')], widthMm),
    ];
  }
  const code: Span = { text: strain.code, face: 'code', ink: 'ink2' };
  const place = [...plain(`${localityWords(strain.locality)}, strain `), code];
  return [headline(nameSpans(strain.scientific, 'bold'), widthMm), underline(place, widthMm)];
}

function headline(spans: Span[], widthMm: number): Block {
  const text = paragraph(spans, widthMm, { sizeMm: TYPE.species, lineMm: 9 }, 2);
  return { heightMm: text.heightMm, marks: (x, y) => text.marks(x, y) };
}

function underline(spans: Span[], widthMm: number): Block {
  const text = paragraph(spans, widthMm, { sizeMm: TYPE.locality, lineMm: 7.2 });
  return { heightMm: text.heightMm + 2, marks: (x, y) => text.marks(x, y) };
}

function localityWords(locality: Locality): string {
  if (locality.known === 'unknown') return 'Locality not known';
  const place = [locality.name, locality.waters].filter((part) => part !== null).join(', ');
  return locality.known === 'trade' ? `sold as ${place}; not traced to a place` : place;
}

function factRows(facts: Fact[], widthMm: number, setting: Setting): Block[] {
  const row = { widthMm, heightMm: setting.rowMm, sizeMm: TYPE.body, ruled: true };
  const rows = facts.map(({ label, text }) =>
    cells(
      [
        { x: 0, text: paragraph(plain(label), LABEL_MM - 2, { sizeMm: TYPE.body, ink: 'ink2' }) },
        { x: LABEL_MM, text: bodyText(text, widthMm - LABEL_MM) },
      ],
      row,
    ),
  );
  const top: Block = {
    heightMm: 0,
    marks: (x, y) => [
      {
        kind: 'line',
        points: [
          [x, y],
          [x + widthMm, y],
        ],
        widthMm: RULES.hair,
        ink: 'rule',
      },
    ],
  };
  return [top, ...rows];
}

function factsOf(content: SheetContent): Fact[] {
  const { birth, inbreeding, generation, strain, issue } = content;
  const age = birth.spawned ? ageAtIssue(birth.spawned, issue.on) : null;
  return [
    { label: 'Fish', text: subjectSpans(content.subject) },
    ...(strain.claim === 'strain' ? strainFacts(strain) : []),
    ...(birth.spawned
      ? [fact('Spawned', `${daysWords(birth.spawned.from, birth.spawned.to)}${age ? `, ${age} old` : ''}`)]
      : []),
    ...(birth.taken ? [takenFact(birth.taken)] : []),
    ...(birth.arrived ? [fact('Kept here since', formatDate(birth.arrived))] : []),
    fact('Generation', generationWords(generation)),
    fact('Inbreeding', inbreedingWords(inbreeding)),
    fact('Pedigree known', completenessWords(inbreeding)),
    ...(birth.raised && birth.raised.of > 0 ? [raisedFact(birth.raised)] : []),
  ];
}

function subjectSpans(subject: SheetContent['subject']): Span[] {
  const heads = headsWords(subject);
  const code: Span = { text: subject.code, face: 'code' };
  if (subject.kind === 'fish')
    return [code, { text: `, ${heads}${subject.sexSure ? '' : ', not certain'}`, face: 'semibold' }];
  return [{ text: `${heads}, of brood `, face: 'semibold' }, code];
}

function strainFacts(strain: Extract<StrainClaim, { claim: 'strain' }>): Fact[] {
  const { tradeName, synonyms, lineBred, source } = strain;
  const other = synonyms.flatMap((name, i): Span[] => [...(i > 0 ? plain(', ') : []), ...nameSpans(name, 'bold')]);
  return [
    ...(lineBred ? [fact('Line-bred', lineBred)] : []),
    ...(tradeName ? [fact('Sold as', tradeName)] : []),
    ...(other.length > 0 ? [{ label: 'Also named', text: other }] : []),
    fact('Founders', foundersWords(strain.founders)),
    ...(source ? [fact('Source', SOURCE_WORDS[source])] : []),
  ];
}

const PROVENANCE = { wildCaught: 'wild caught', bredElsewhere: 'bred elsewhere', unknown: 'origin not known' } as const;

function foundersWords(founders: Founders): string {
  return [
    PROVENANCE[founders.provenance],
    ...(founders.from ? [`from ${founders.from}`] : []),
    ...(founders.on ? [partialDayWords(founders.on)] : []),
    ...(founders.papers ? [`papers: ${founders.papers}`] : []),
  ].join(', ');
}

const TAKEN = { stripped: 'Stripped', released: 'Released', hatched: 'Hatched' } as const;

function takenFact({ how, on, holdDay }: NonNullable<SheetContent['birth']['taken']>): Fact {
  return fact(TAKEN[how], `${formatDate(on)}${holdDay === null ? '' : `, day ${holdDay} of the hold`}`);
}

const raisedFact = ({ alive, of }: { alive: number; of: number }): Fact =>
  fact('Raised', `${alive} of ${of}, ${shareWords(alive / of)}`);

/** Said where no photo is printed. */
const photoFacts = (count: number, printed: boolean): Fact[] =>
  count > 0 && !printed ? [fact('Photos', `${count} recorded`)] : [];

/** The photo in its own proportions, no taller than the setting allows, and what it shows. */
function pictureBlocks(shown: NonNullable<SheetContent['photos']['shown']>, count: number, setting: Setting): Block[] {
  const scale = Math.min(PICTURE_MM / shown.widthPx, setting.pictureMm / shown.heightPx);
  const [width, height] = [shown.widthPx * scale, shown.heightPx * scale];
  const taken = shown.takenOn ? `, ${formatDate(shown.takenOn)}` : '';
  const more = count > 1 ? ` One of ${count} photos.` : '';
  const caption = smallText(plain(`${shown.caption}${taken}.${more}`), PICTURE_MM);
  return [
    {
      heightMm: height,
      marks: (x, y): Mark[] => [{ kind: 'picture', x, y, widthMm: width, heightMm: height, alt: shown.caption }],
    },
    { heightMm: caption.heightMm + 1, marks: (x, y) => caption.marks(x, y + 1) },
  ];
}
