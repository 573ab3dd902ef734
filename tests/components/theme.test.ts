import { describe, expect, test } from 'vitest';
import { dark } from '@/components/theme/dark';
import { light, paper } from '@/components/theme/light';
import { stages, type Theme } from '@/components/theme/theme';
import { type TextSize, textMeasure } from '@/components/theme/type';

/** Relative luminance and contrast ratio as WCAG 2.2 defines them (w3.org/TR/WCAG22/#dfn-contrast-ratio). */
function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5]
    .map((at) => Number.parseInt(hex.slice(at, at + 2), 16) / 255)
    .map((c) => (c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4));
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(a: string, b: string): number {
  const [lighter = 0, darker = 0] = [luminance(a), luminance(b)].sort((x, y) => y - x);
  return (lighter + 0.05) / (darker + 0.05);
}

test('black on white is 21 to 1, as WCAG says', () => expect(contrast('#000000', '#FFFFFF')).toBeCloseTo(21, 5));

const AA_TEXT = 4.5;
const AA_GRAPHIC = 3;
const covers = ['ground', 'sheet', 'well', 'select', 'troubleWash'] as const;

describe.each([dark, light, paper])('the $name theme on $ground', (theme: Theme) => {
  test.each(covers)('words of every importance can be read on %s', (cover) => {
    for (const ink of [theme.ink, theme.ink2]) expect(contrast(ink, theme[cover])).toBeGreaterThanOrEqual(AA_TEXT);
    if (cover !== 'troubleWash') expect(contrast(theme.ink3, theme[cover])).toBeGreaterThanOrEqual(AA_TEXT);
  });

  test.each(['ground', 'sheet', 'well', 'troubleWash'] as const)('trouble can be read on %s', (cover) =>
    expect(contrast(theme.trouble, theme[cover])).toBeGreaterThanOrEqual(AA_TEXT),
  );

  test('the label of a primary button and of an alarm can be read', () => {
    expect(contrast(theme.actInk, theme.actFill)).toBeGreaterThanOrEqual(AA_TEXT);
    expect(contrast(theme.troubleInk, theme.troubleFill)).toBeGreaterThanOrEqual(AA_TEXT);
  });

  test('outlines of controls and the focus ring can be told from what they lie on', () => {
    for (const cover of ['ground', 'sheet', 'well'] as const) {
      expect(contrast(theme.control, theme[cover])).toBeGreaterThanOrEqual(AA_GRAPHIC);
      expect(contrast(theme.focus, theme[cover])).toBeGreaterThanOrEqual(AA_GRAPHIC);
    }
  });

  test('every stage can be told from the page, and grows darker from egg to adult', () => {
    const lights = stages.map((stage) => luminance(theme.stage[stage]));
    expect(lights).toEqual([...lights].sort((a, b) => b - a));
    expect(new Set(lights).size).toBe(stages.length);
    for (const stage of stages) expect(contrast(theme.stage[stage], theme.ground)).toBeGreaterThanOrEqual(AA_GRAPHIC);
  });
});

const sizes: TextSize[] = ['label', 'small', 'body', 'large', 'title', 'heading', 'page', 'display'];

test.each(['phone', 'narrow', 'full'] as const)('no words under 13 px on a %s screen', (breakpoint) => {
  for (const size of sizes) expect(textMeasure(size, breakpoint).fontSize).toBeGreaterThanOrEqual(13);
});
