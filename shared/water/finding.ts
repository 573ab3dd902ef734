/** What a finding is about. */
type FindingOf =
  | 'temperature'
  | 'ph'
  | 'hardness'
  | 'ammonia'
  | 'nitrite'
  | 'nitrate'
  | 'retest'
  | 'volume'
  | 'group'
  | 'sexRatio'
  | 'mouths'
  | 'hybrids'
  | 'crowding'
  | 'unknown';

/**
 * Something to look at (hollow triangle) or to act on now (filled). `says` is the fact in the reader's units, `because` what
 * it rests on. Always advice: nothing is refused for it.
 */
export type Finding = { of: FindingOf; level: 'look' | 'act'; says: string; because: string };

/** Loudest first; otherwise in the order they were found. */
export const loudestFirst = (findings: Finding[]): Finding[] => [
  ...findings.filter(({ level }) => level === 'act'),
  ...findings.filter(({ level }) => level === 'look'),
];
