import { foldedEmail } from '../../shared/accounts/shapes';
import * as ask from '../../shared/buyers/ask';
import { readAvailable, showAvailablePhoto } from '../../shared/buyers/available';
import { listOffers, setListing, setPublicPage } from '../../shared/buyers/offers';
import { closeRequest, listRequests, orderRequest, previewRequestLetter } from '../../shared/buyers/requests';
import { DONE } from '../../shared/endpoint';
import { limitOf } from '../http/limitOf';
import type { Serve } from '../http/serve';
import { availablePage, photoOnPage } from './available';
import { offersOf, setOffer } from './offers';
import { confirm, ownRequest, stop, withdraw } from './ownRequest';
import { pageOf, setPage } from './page';
import { askOnPage } from './pending';
import { requestLetter } from './requestLetters';
import { endRequest, orderOfRequest, requestRows } from './requests';

/** In the fishroom. */
export function buyerRoutes(serve: Serve): void {
  serve.read(listOffers, async (scope) => ({
    offers: await offersOf(scope),
    page: await pageOf(scope),
    ...(await scope.db.selectFrom('room').where('id', '=', scope.roomId).select('slug').executeTakeFirstOrThrow()),
  }));
  serve.write(setListing, (scope, { params, body }) => setOffer(scope, params.broodId, body));
  serve.write(setPublicPage, (scope, { body }) => setPage(scope, body));
  serve.read(listRequests, async (scope) => ({ requests: await requestRows(scope) }));
  serve.write(orderRequest, (scope, { params, body }) => orderOfRequest(scope, params.requestId, body));
  serve.write(closeRequest, async (scope, { params, body }) => {
    await endRequest(scope, params.requestId, body);
    return DONE;
  });
  serve.read(previewRequestLetter, (scope, { params, query }) => requestLetter(scope, params.requestId, query.kind));
}

/** For anyone: the public page, and what is behind the link of a letter. The limits are the door's. */
export function publicRoutes(serve: Serve): void {
  const lettersToAddress = limitOf(6, 60);
  const lettersFromAddress = limitOf(60, 60);
  const linksFromAddress = limitOf(60, 15, { failuresOnly: true });
  serve.open(readAvailable, (asked, { params }) => availablePage(asked, params.slug));
  serve.open(showAvailablePhoto, async (asked, { params }, { res }) => {
    const { roomId, name } = await photoOnPage(asked, params.slug, params.photoId);
    await asked.house.pictures.send(res, { roomId, id: params.photoId, size: params.size, name });
    return null;
  });
  /** Taken, not done: whether the address is known here is not said. */
  serve.open(ask.askForFish, async (asked, { params, body }, raw) => {
    await lettersFromAddress(raw);
    await lettersToAddress(raw, foldedEmail(body.email));
    await askOnPage(asked, params.slug, body);
    raw.res.status(202);
    return DONE;
  });
  for (const [line, rule] of [
    [ask.readOwnRequest, ownRequest],
    [ask.confirmRequest, confirm],
    [ask.withdrawRequest, withdraw],
    [ask.stopNotices, stop],
  ] as const) {
    serve.open(line, async (asked, { params }, raw) => {
      await linksFromAddress(raw);
      raw.res.set({ 'X-Robots-Tag': 'noindex', 'Referrer-Policy': 'no-referrer' });
      return rule(asked, params.token);
    });
  }
}
