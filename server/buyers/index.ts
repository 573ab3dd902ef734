import { readAvailable, showAvailablePhoto } from '../../shared/buyers/available';
import { listOffers, setListing, setPublicPage } from '../../shared/buyers/offers';
import type { Feature } from '../features';
import { availablePage, photoOnPage } from './available';
import { offersOf, setOffer } from './offers';
import { pageOf, setPage } from './page';
import { publicPages } from './publicPages';

export const buyers: Feature = {
  routes: (serve) => {
    serve.read(listOffers, async (scope) => ({
      offers: await offersOf(scope),
      page: await pageOf(scope),
      ...(await scope.db.selectFrom('room').where('id', '=', scope.roomId).select('slug').executeTakeFirstOrThrow()),
    }));
    serve.write(setListing, (scope, { params, body }) => setOffer(scope, params.broodId, body));
    serve.write(setPublicPage, (scope, { body }) => setPage(scope, body));
    serve.open(readAvailable, (asked, { params }) => availablePage(asked, params.slug));
    serve.open(showAvailablePhoto, async (asked, { params }, { res }) => {
      const { roomId, name } = await photoOnPage(asked, params.slug, params.photoId);
      await asked.house.pictures.send(res, { roomId, id: params.photoId, size: params.size, name });
      return null;
    });
  },
  pages: publicPages,
};
