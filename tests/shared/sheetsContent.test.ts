import { describe, expect, it, test } from 'vitest';
import { inbreeding } from '../../shared/lineage/inbreeding';
import { ancestryFault, animalId, splitAnimalId } from '../../shared/sheets/ancestry';
import { cautionsFor } from '../../shared/sheets/cautions';
import { SheetContent } from '../../shared/sheets/content';
import { SOURCE_WORDS, SourceCode } from '../../shared/sheets/sourceCodes';
import { animal, duboisi, wild } from '../support/sheetContent';

const refusal = (content: unknown): string[] => {
  const result = SheetContent.safeParse(content);
  return result.success ? [] : result.error.issues.map((issue) => issue.message);
};

test('a sheet reads back as exactly what was frozen', () => {
  expect(SheetContent.parse(JSON.parse(JSON.stringify(duboisi)))).toEqual(duboisi);
});

test('a sheet with a key nobody knows is refused, at the top and deep inside', () => {
  expect(refusal({ ...duboisi, permit: 'none' })).not.toEqual([]);
  expect(refusal({ ...duboisi, water: { ...duboisi.water, ammonia: 0 } })).not.toEqual([]);
});

test('a sheet of a later format is refused', () => {
  expect(refusal({ ...duboisi, format: 2 })).not.toEqual([]);
});

test('a possible hybrid has no room for a strain’s claims', () => {
  const kinds = [
    { scientific: 'Tropheus duboisi', locality: 'Maswa' },
    { scientific: 'Tropheus sp.', locality: null },
  ];
  expect(refusal({ ...duboisi, strain: { claim: 'possibleHybrid', kinds } })).toEqual([]);
  expect(refusal({ ...duboisi, strain: { claim: 'possibleHybrid', kinds, code: 'DUMA' } })).not.toEqual([]);
  expect(refusal({ ...duboisi, strain: { ...duboisi.strain, claim: 'possibleHybrid' } })).not.toEqual([]);
});

test('a curve may not run past the last sample: a sheet makes no forecast', () => {
  const growth = duboisi.growth;
  if (!growth?.fitted) throw new Error('the example has a curve');
  const points = [...growth.fitted.points, { on: '2026-06-01', meanMm: 50 }];
  expect(refusal({ ...duboisi, growth: { ...growth, fitted: { ...growth.fitted, points } } })).toContain(
    'The curve stays within what was measured',
  );
});

test('a name that would turn the direction of the line round is refused', () => {
  expect(refusal({ ...duboisi, fishroom: { ...duboisi.fishroom, name: 'Lark\u202emoor' } })).toContain(
    'Leave out line breaks and control characters',
  );
});

test('an address that hides its host is refused', () => {
  for (const address of ['https://larkmoor.example@other.example', 'javascript:alert(1)', 'larkmoor.example']) {
    expect(refusal({ ...duboisi, fishroom: { ...duboisi.fishroom, address } })).toContain(
      'An address such as https://fish.example is needed',
    );
  }
});

describe('the ancestry as a whole', () => {
  const [brood, ...ancestors] = duboisi.ancestry;

  it('must list every parent it names', () => {
    expect(ancestryFault(duboisi.ancestry.slice(0, 4))).toBe('A parent of DUMA-A01 is not listed');
  });

  it('may not list an animal twice', () => {
    expect(ancestryFault([...duboisi.ancestry, wild(1, 'DUMA-W09', 'male')])).toBe('An animal is listed twice');
  });

  it('may not hold an animal among its own ancestors, even as one of several possible ones', () => {
    const loop = ancestors.map((entry) =>
      entry.id === animal(1) && 'sire' in entry
        ? { ...entry, sire: { kind: 'mixed' as const, candidates: [{ id: animal(10), weight: 1 }] } }
        : entry,
    );
    expect(refusal({ ...duboisi, ancestry: [brood, ...loop] })).toEqual(['DUMA-25H is among its own ancestors']);
  });

  it('must hold the fish that the sheet is for', () => {
    expect(refusal({ ...duboisi, ancestry: [wild(1, 'DUMA-W01', 'male')] })).toContain(
      'The fish itself is missing from its ancestry',
    );
  });

  it('is judged in a moment with 5 000 young of one pair', () => {
    const young = Array.from({ length: 5000 }, (_, i) => ({
      ...wild(1000 + i, `Y${i}`, 'male'),
      sire: { kind: 'known' as const, id: animal(1) },
      dam: { kind: 'known' as const, id: animal(2) },
    }));
    const start = performance.now();
    expect(ancestryFault([...young, wild(1, 'A', 'male'), wild(2, 'B', 'female')])).toBeNull();
    expect(performance.now() - start).toBeLessThan(1000);
  });
});

test('the ancestry is a pedigree as it stands: another fishroom works out the same F from it', () => {
  // By hand: the first male is no kin of the dam. The second, 7 days of 33, is her brother by W04, and by W03 at 0.4:
  // kinship (0.4 / 2 + 1 / 2) / 4 = 0.175, so F = 7 / 33 * 0.175 = 0.0371.
  expect(inbreeding(duboisi.ancestry).get(duboisi.subject.id)).toBeCloseTo(0.0371, 4);
  expect(duboisi.inbreeding?.f).toBeCloseTo(0.0371, 4);
});

test('an animal’s id names its fishroom and itself, and nothing else passes for one', () => {
  const [room = '', local = ''] = animal(3).split('/');
  expect(splitAnimalId(animalId(room, local))).toEqual({ roomId: room, localId: local });
  for (const text of ['', room, `${room}/`, `${room}/${local}/${local}`, `${room}/DUMA-A01`]) {
    expect(splitAnimalId(text)).toBeNull();
  }
});

test('every source code of an animal has words, and the letter F is not among them', () => {
  // CITES Res. Conf. 12.3; 50 CFR 23.24. A and Y are for plants.
  expect(SourceCode.options.toSorted()).toEqual(['C', 'D', 'F', 'I', 'O', 'R', 'U', 'W', 'X']);
  for (const words of Object.values(SOURCE_WORDS)) expect(words).not.toMatch(/\bF\b/);
});

test('cautions say how to bring fish home, never to release them, and what law may ask', () => {
  const text = cautionsFor({ treated: false })
    .map((caution) => `${caution.about}. ${caution.text}`)
    .join(' ');
  // Common practice, no source: within 0.3 pH and 2 °C.
  expect(text).toContain('Match within 0.3 pH and 2 °C');
  expect(text).toContain('No slow dripping. Once the bag is open its pH rises and the ammonia in it turns toxic.');
  expect(text).toContain('Never let fish, eggs or water go into a stream, pond or drain.');
  expect(text).toContain('may need a permit where you live: check locally');
  expect(text).not.toContain('A treatment was running');
});

test('fish that leave under treatment say so first', () => {
  expect(cautionsFor({ treated: true })[0]?.text).toContain('Follow its label and your veterinarian');
});
