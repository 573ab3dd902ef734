import { expect, test } from 'vitest';
import { found } from '@/components/form/found';

const tanks = [
  { word: 'Northern rack, top', code: 'N1' },
  { word: 'Northern rack, middle', code: 'N2' },
  { word: 'Żółta łąka', code: 'T07', note: '600 L' },
  { word: 'Grow-out', code: 'G3', note: 'beside T07' },
];
const codes = (search: string) => found(tanks, search).map((tank) => tank.code);

test('an empty search leaves everything in its order', () => expect(codes('  ')).toEqual(['N1', 'N2', 'T07', 'G3']));
test('letters with strokes and dots are found without them', () => expect(codes('zolta laka')).toEqual(['T07']));
test('every typed word has to begin a word of the name', () => {
  expect(codes('mid north')).toEqual(['N2']);
  expect(codes('orth')).toEqual([]);
});
test('what begins with the search comes before what only mentions it', () =>
  expect(codes('t07')).toEqual(['T07', 'G3']));
test('part of a name with a hyphen is found', () => expect(codes('out')).toEqual(['G3']));
