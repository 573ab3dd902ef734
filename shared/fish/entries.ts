import * as z from 'zod/mini';
import { DayText } from '../days';
import { Id } from '../ids';
import { Note } from '../shapes';

/** "Dominant from today": one tap. Another male of the tank that was dominant is not so from that day on. */
export const Dominant = z.strictObject({ kind: z.literal('dominant'), fishId: Id, onDay: DayText, note: Note });

export const fishEntries = [Dominant] as const;
