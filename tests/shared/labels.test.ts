import { describe, expect, it } from 'vitest';
import type { Label } from '../../shared/labels/label';
import { labelPages } from '../../shared/labels/layout';
import { widthOf } from '../../shared/print/measure';
import type { Mark, TextMark } from '../../shared/print/page';

const tank = {
  kind: 'tank',
  place: 'Left rack, middle',
  volume: '450 L',
  url: 'https://larkmoor.example/t',
  typed: 'T-7H4',
} as const;

const labels: Record<string, Label> = {
  'a short code': { ...tank, code: 'G3' },
  'a long code': { ...tank, code: 'NURSERY-12-LEFT' },
  'a code of several words': { ...tank, code: 'Rack 3 left' },
  'a long place': {
    ...tank,
    code: 'Rack 3 left',
    place: 'the lowest shelf on the far side of the door, behind the water butts and the spare heaters',
  },
  'no place and no volume': { ...tank, code: 'T07', place: null, volume: null },
  'a colony with a long name': {
    kind: 'colony',
    code: 'PTIK-AB',
    scientific: 'Petrochromis sp. "kasumbe rainbow" cf. ephippium',
    locality: 'Kasumbe, southern shore, Lake Tanganyika',
    url: tank.url,
    typed: 'PTIK-AB-7H4',
  },
  'a colony of no known strain': {
    kind: 'colony',
    code: 'MIX-A',
    scientific: null,
    locality: null,
    url: tank.url,
    typed: 'MIX-A-7H4',
  },
};

const textsIn = (marks: Mark[]): TextMark[] => marks.flatMap((mark) => (mark.kind === 'text' ? [mark] : []));
const sizeOf = (code: string): number => {
  const [page] = labelPages([{ ...tank, code }], 'single', { fishroom: '' });
  return textsIn(page?.marks ?? []).find(({ face }) => face === 'code')?.sizeMm ?? 0;
};

describe.each(Object.entries(labels))('a label with %s', (_, label) => {
  const [page] = labelPages([label], 'single', { fishroom: 'Larkmoor Fishroom' });
  const texts = textsIn(page?.marks ?? []);

  it('keeps its text clear of the square code and its white border', () => {
    for (const text of texts.filter(({ text }) => text !== label.typed)) {
      const right = text.x + widthOf(text.text, text.face, text.sizeMm, text.tracking);
      expect(right, text.text).toBeLessThanOrEqual(90 - 5.5 - 31 - 4.3 + 0.1);
    }
  });

  it('has no line on another, and none past the edge', () => {
    const left = texts.filter(({ text }) => text !== label.typed).toSorted((a, b) => a.y - b.y);
    for (const [i, text] of left.entries()) {
      expect(text.y).toBeLessThan(52 - 3);
      const above = left[i - 1];
      if (above && above.y !== text.y) expect(text.y - 0.68 * text.sizeMm, text.text).toBeGreaterThan(above.y);
    }
  });
});

describe('the code on a label', () => {
  it('is 18 mm where it fits', () => {
    expect(sizeOf('T03')).toBe(18);
    expect(sizeOf('G3')).toBe(18);
  });

  it('gets smaller with its length and stays readable across the room', () => {
    expect(sizeOf('1204')).toBeLessThan(18);
    expect(sizeOf('DUMA-A')).toBeGreaterThanOrEqual(8.5);
  });
});
