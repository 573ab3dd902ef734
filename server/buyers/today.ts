import type * as z from 'zod/mini';
import { askedWords } from '../../shared/buyers/requestWords';
import { dayOf } from '../../shared/days';
import { may } from '../../shared/roles';
import type { RequestToday } from '../../shared/today/facts';
import type { Scope } from '../scope';
import { openRequests, placesOf } from './row';
import { oneRequest } from './stored';
import { whatOf } from './what';

/** Requests for fish that are there: whoever waits for fish to come free or to grow waits for no answer. */
export async function requestsToday(scope: Scope): Promise<z.input<typeof RequestToday>[]> {
  if (!may(scope.role, 'buyer:see')) return [];
  const open = await openRequests(scope);
  const places = placesOf(open);
  const told = [];
  for (const request of open) {
    if (request.kind !== 'fish' || !places.get(request.id)?.fits) continue;
    const { id, confirmedAt, createdAt, notifiedAt, heads, lengthTenthsMm } = request;
    const { name, locality, broodCode } = await whatOf(scope, request);
    const { buyerName } = await oneRequest(scope, id);
    const waitsSince = dayOf(Date.parse(notifiedAt ?? confirmedAt ?? createdAt), scope.timeZone);
    const what = askedWords('fish', { name, locality, heads, lengthTenthsMm });
    told.push({ id, code: broodCode ?? '', what, buyerName, waitsSince });
  }
  return told;
}
