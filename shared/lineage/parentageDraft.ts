import * as z from 'zod/mini';
import { Id } from '../ids';
import { Note } from '../shapes';

const Share = z
  .number('Type a share')
  .check(z.gt(0, 'A share is above zero'), z.maximum(1_000_000, 'That is too large'));

/** A possible parent and its share; `fishId` null is a fish that is not known. Shares need not sum to 1. */
const Candidate = z.strictObject({ fishId: z.nullable(Id), weight: Share });

const onceEach = (candidates: { fishId: string | null }[]) =>
  new Set(candidates.map(({ fishId }) => fishId)).size === candidates.length;

const Candidates = z
  .array(Candidate)
  .check(z.maxLength(40, 'At most 40 possible parents'), z.refine(onceEach, 'Name each possible parent once'));

/**
 * Who may be the parents of a hold, a brood or a fish. An empty list: nothing is known of that side. `single`: one male
 * sired all, not known which; `mixed`: each egg is its own draw. The dam of one mouthful is always one female.
 */
export const ParentageDraft = z.strictObject({
  paternity: z.enum(['single', 'mixed'], 'Choose one father for all, or several'),
  sires: Candidates,
  dams: Candidates,
  /** What the shares rest on, in words: "dominant 12 of 15 days". */
  basis: Note,
});
export type ParentageDraft = z.output<typeof ParentageDraft>;
