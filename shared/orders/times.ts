import * as z from 'zod/mini';
import { type Day, dayWords, isDay } from '../days';

const PATTERN = /^\d{4}-\d{2}-\d{2}T(?:[01]\d|2[0-3]):[0-5]\d$/;

/** A time on the fishroom's own clock, such as 2026-06-20T10:30: it has no zone, the place decides. */
export const LocalTime = z
  .string('Choose a time')
  .check(z.refine((text) => PATTERN.test(text) && isDay(text.slice(0, 10)), 'Type a time such as 2026-06-20 10:30'));

/** "Sat 20 Jun, 10:30". */
export const timeWords = (time: string, today: Day): string =>
  `${dayWords(time.slice(0, 10), today)}, ${time.slice(11, 16)}`;
