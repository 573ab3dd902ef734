import type { Breakpoint } from './breakpoint';

const SYSTEM = 'Verdana, system-ui, sans-serif';

export const family = {
  text: `'Atkinson Hyperlegible Next', ${SYSTEM}`,
  /** Every code: fish, brood, colony, tank, order, issue. */
  code: `'Atkinson Hyperlegible Mono', ui-monospace, monospace`,
  /** Digits from 22 px up; never letters, never codes. */
  figure: `'Sofia Sans Extra Condensed', 'Atkinson Hyperlegible Next', ${SYSTEM}`,
} as const;

export type TextSize = 'label' | 'small' | 'body' | 'large' | 'title' | 'heading' | 'page' | 'display';
type Measure = { fontSize: number; lineHeight: number; letterSpacing?: number };

/** Nothing under 13 px. `large` is a strong word in a control, `page` a place's own name. */
const phone: Record<TextSize, Measure> = {
  label: { fontSize: 13, lineHeight: 16 },
  small: { fontSize: 15, lineHeight: 20 },
  body: { fontSize: 17, lineHeight: 24 },
  large: { fontSize: 19, lineHeight: 24 },
  title: { fontSize: 21, lineHeight: 26 },
  heading: { fontSize: 27, lineHeight: 32, letterSpacing: -0.27 },
  page: { fontSize: 32, lineHeight: 36, letterSpacing: -0.32 },
  display: { fontSize: 40, lineHeight: 42, letterSpacing: -1 },
};

const wide: Record<TextSize, Measure> = {
  label: { fontSize: 13, lineHeight: 16 },
  small: { fontSize: 14, lineHeight: 19 },
  body: { fontSize: 15, lineHeight: 21 },
  large: { fontSize: 17, lineHeight: 22 },
  title: { fontSize: 19, lineHeight: 24 },
  heading: { fontSize: 26, lineHeight: 30, letterSpacing: -0.26 },
  page: { fontSize: 32, lineHeight: 36, letterSpacing: -0.32 },
  display: { fontSize: 40, lineHeight: 42, letterSpacing: -1 },
};

export const textMeasure = (size: TextSize, breakpoint: Breakpoint): Measure =>
  breakpoint === 'phone' ? phone[size] : wide[size];

/** Figure sizes: margin of a row, headline strip, trouble, day of a hold. */
export const figurePx = { s: 32, m: 44, l: 68, xl: 84 } as const;
export type FigureSize = keyof typeof figurePx;
