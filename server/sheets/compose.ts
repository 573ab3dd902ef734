import { addDays } from '../../shared/days';
import { cautionsFor } from '../../shared/sheets/cautions';
import type { SheetContent } from '../../shared/sheets/content';
import type { Scope } from '../scope';
import { growthOf, photoCount, runningIn, waterOf } from './conditionsPart';
import { factsKnown } from './known';
import { ancestorsOf, lineageOf, namingOf } from './lineagePart';
import { broodAbout, fishAbout, type Subject } from './subjectPart';

type Issue = SheetContent['issue'];

/** Gathers all that a sheet says, out of what was recorded. `keyId` is the key that is going to sign it. */
export async function composeSheet(scope: Scope, subject: Subject, issue: Issue, keyId: string): Promise<SheetContent> {
  const room = await scope.db
    .selectFrom('room')
    .where('id', '=', scope.roomId)
    .select(['name', 'place'])
    .executeTakeFirstOrThrow();
  const { about, tankIds, spawn } = await (subject.thing === 'fish'
    ? fishAbout(scope, subject)
    : broodAbout(scope, subject));
  const nodes = await ancestorsOf(scope, subject.id);
  const treatments = await runningIn(scope, tankIds);
  return {
    format: 1,
    issue,
    fishroom: { id: scope.roomId, name: room.name, place: room.place, address: scope.house.config.origin, keyId },
    ...about,
    ...lineageOf(nodes, subject.id, await namingOf(scope)),
    growth: await growthOf(scope, subject, spawn),
    water: await waterOf(scope, tankIds, about.birth.taken?.on ?? addDays(scope.today, -365)),
    known: await factsKnown(scope, subject),
    photos: { count: await photoCount(scope, subject), shown: null },
    treatments,
    cautions: cautionsFor({ treated: treatments.length > 0 }),
  };
}
