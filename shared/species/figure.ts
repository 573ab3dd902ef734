/** Where a figure comes from: read in a source, remembered, breeders' habit, assumed, typed by the fishroom, or filled in. */
export type Standing = 'found' | 'memory' | 'practice' | 'assumption' | 'room' | 'fallback';
export type Confidence = 'high' | 'medium' | 'low';

/** One figure of a profile with what it rests on. */
export type Figure<T> = { value: T; source: string; standing: Standing; confidence: Confidence; note?: string };

export const STANDING_WORDS: Record<Standing, string> = {
  found: 'Read in the source named',
  memory: 'From memory, not checked',
  practice: 'Common practice, not measured',
  assumption: 'Assumed, not measured',
  room: 'Set by this fishroom',
  fallback: 'Filled in from related species',
};

const figure =
  (standing: Standing, source: string) =>
  <const T>(value: T, confidence: Confidence, note?: string): Figure<T> =>
    note === undefined ? { value, source, standing, confidence } : { value, source, standing, confidence, note };

export const memory = figure('memory', STANDING_WORDS.memory);
export const practice = figure('practice', 'Common practice among breeders, no source');

/** A generic rate of fish embryos, plausible from 1.8 to 3.0; no species of the library has been measured. */
export const assumedRate = <const T>(value: T): Figure<T> =>
  figure('assumption', 'Generic rate of fish embryos, plausible 1.8 to 3.0; not measured in this species')(
    value,
    'low',
  );

/** Length-weight by body shape alone. */
export const byShape = <const T>(value: T): Figure<T> =>
  figure('assumption', 'By body shape: expect an error of about 35 %, until your own fish are weighed')(value, 'low');

export const found = <const T>(value: T, confidence: Confidence, source: string, note?: string): Figure<T> =>
  figure('found', source)(value, confidence, note);
