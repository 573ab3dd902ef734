import type { Migration } from 'kysely';
import * as accounts from './001-accounts';
import * as rooms from './002-rooms';
import * as stock from './003-stock';
import * as broods from './004-broods';
import * as care from './005-care';
import * as lineageSheets from './006-lineage-sheets';
import * as buyers from './007-buyers';
import * as toldFish from './010-told-fish';
import * as orders from './012-orders';
import * as indexes from './015-indexes';
import * as imports from './016-imports';
import * as requests from './017-requests';
import * as tasks from './019-tasks';
import * as myDay from './020-my-day';

/** In order, by hand. A migration that has landed is never edited: what must change goes into the next one. */
export const migrations: Record<string, Migration> = {
  '001-accounts': accounts,
  '002-rooms': rooms,
  '003-stock': stock,
  '004-broods': broods,
  '005-care': care,
  '006-lineage-sheets': lineageSheets,
  '007-buyers': buyers,
  '010-told-fish': toldFish,
  '012-orders': orders,
  '015-indexes': indexes,
  '016-imports': imports,
  '017-requests': requests,
  '019-tasks': tasks,
  '020-my-day': myDay,
};
