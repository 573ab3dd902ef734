import type { About } from '../../shared/record/contract';
import type { ContentOf, EntryKind } from '../../shared/record/kinds';
import type { Action } from '../../shared/roles';
import { broodKinds } from '../broods/entries';
import { fishKinds } from '../fish/entries';
import { growthKinds } from '../growth/entries';
import { holdKinds } from '../holds/entries';
import { photoKinds } from '../photos/entries';
import type { StoredPicture } from '../pictures';
import type { Scope } from '../scope';
import { waterKinds } from '../water/entries';

/** The envelope as a rule sees it while its content is being stored. */
export type Envelope = { entryId: string; madeAt: string; picture?: Picture };

/** A picture that came with the entry, its files stored already. */
export type Picture = Pick<StoredPicture, 'takenOn' | 'takenAt' | 'width' | 'height' | 'bytes' | 'sha256'>;

/** What storing an entry did: the day it is about, what it concerns, one line for the history, and the rows it made. */
export type Stored = { onDay: string; about: About[]; made?: Record<string, string> };

export type KindRule<K extends EntryKind> = {
  /** More than `entry:record`, where a kind asks for it. */
  needs?: Action;
  store(scope: Scope, content: ContentOf<K>, envelope: Envelope): Promise<Stored>;
  /** For what a kind changed in place; rows made, intervals ended and ledger lines are taken back for every kind alike. */
  undo?(scope: Scope, content: ContentOf<K>): Promise<void>;
  /** One line in the keeper's words, without the date: "Holding seen, 04". Codes of what it concerns come in `codes`. */
  say(content: ContentOf<K>, codes: (id: string) => string): string;
};

export type KindRules = { [K in EntryKind]: KindRule<K> };

/** What each kind of entry does. The shapes are in `shared/<feature>/entries.ts`. */
export const kindRules: KindRules = {
  ...fishKinds,
  ...holdKinds,
  ...broodKinds,
  ...growthKinds,
  ...photoKinds,
  ...waterKinds,
};

/** A kind's rule, as a rule for contents of any kind: the content's own `kind` chose it. */
export const ruleOf = (kind: EntryKind) => kindRules[kind] as KindRule<EntryKind>;
