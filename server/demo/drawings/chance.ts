/** Numbers from 0 up to 1 that depend on the words alone, so that a picture is the same on every machine. */
export function chanceOf(words: string): () => number {
  let state = 2166136261;
  for (const letter of words) {
    state = Math.imul(state ^ (letter.codePointAt(0) ?? 0), 16777619);
  }
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}

export type Chance = () => number;

/** A number between low and high. */
export const between = (chance: Chance, low: number, high: number): number => low + (high - low) * chance();

/** A normal deviate (Box and Muller 1958). */
export function normal(chance: Chance, mean: number, sd: number): number {
  const radius = Math.sqrt(-2 * Math.log(1 - chance()));
  return mean + sd * radius * Math.cos(2 * Math.PI * chance());
}
