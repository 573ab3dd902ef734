/** Distances in px; nothing between them. */
export const space = { 1: 4, 2: 8, 3: 12, 4: 16, 5: 20, 6: 24, 8: 32, 10: 40, 12: 48 } as const;

/** Margin of a page, by width. */
export const gutter = { phone: 16, wide: 24 } as const;

/** Column of the margin figure, left of its rule. */
export const marginColumn = { phone: 52, wide: 44 } as const;

/** The product is square-cut: 2 px on controls, 1 px on bars. */
export const radius = { control: 2, bar: 1 } as const;

/** Reach of what can be pressed. */
export const target = { least: 48, primary: 56, keypad: 64, wide: 44 } as const;

/** Widths of lines. */
export const line = { row: 1, section: 2, control: 1.5, place: 4 } as const;

/** Height of the bottom bar, and how far the Record cell stands above it. */
export const bar = { height: 88, rise: 12 } as const;
