/** Colours as '#rrggbb'. */
type Channels = [number, number, number];

function channels(hex: string): Channels {
  const value = Number.parseInt(hex.slice(1), 16);
  return [value >> 16, (value >> 8) & 255, value & 255];
}

const hexOf = (parts: Channels): string =>
  `#${parts
    .map((part) =>
      Math.max(0, Math.min(255, Math.round(part)))
        .toString(16)
        .padStart(2, '0'),
    )
    .join('')}`;

/** Part of the way from one colour to another. */
export function mix(from: string, to: string, share: number): string {
  const [r1, g1, b1] = channels(from);
  const [r2, g2, b2] = channels(to);
  return hexOf([r1 + (r2 - r1) * share, g1 + (g2 - g1) * share, b1 + (b2 - b1) * share]);
}

/** The colour under light of another strength: 1 leaves it, 0.5 halves it. */
export function lit(hex: string, strength: number): string {
  const [r, g, b] = channels(hex);
  return hexOf([r * strength, g * strength, b * strength]);
}

/** Colour at a place on a scale of stops, which must be in rising order. */
export function colourAt(stops: readonly (readonly [number, string])[], place: number): string {
  let before = stops[0];
  for (const stop of stops) {
    if (stop[0] >= place) {
      if (!before || before === stop) return stop[1];
      return mix(before[1], stop[1], (place - before[0]) / (stop[0] - before[0]));
    }
    before = stop;
  }
  return before?.[1] ?? '#808080';
}
