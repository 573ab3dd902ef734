import { DONE } from '../../shared/endpoint';
import { exportBooks, readBooks } from '../../shared/orders/books';
import { addBuyerName, listBuyerNames } from '../../shared/orders/buyerNames';
import * as line from '../../shared/orders/contract';
import { eraseBuyer, exportBuyer } from '../../shared/orders/privacy';
import type { Serve } from '../http/serve';
import { bookDeaths, takeBack } from './afterwards';
import { booksPage, sendBooks } from './books';
import { addName, buyerNames } from './buyerNames';
import { addMessage, agree, changeOne, offer, readMessages } from './change';
import { giveOver } from './handOver';
import { letterPreview } from './letterPages';
import { changeOneLine, makeOrder } from './make';
import { cancel, move } from './moves';
import { orderPage } from './page';
import { bookByHand, payBack } from './payments';
import { erase, sendBuyer } from './privacy';
import { sendReceipt } from './receipt';
import { seesOf } from './room';
import { orderRows } from './rows';
import { setTerms, termsPage } from './terms';

export function orderRoutes(serve: Serve): void {
  serve.read(line.listOrders, async (scope, { query }) => ({
    orders: await orderRows(scope, seesOf(scope), { openOnly: query.which === 'open' }),
  }));
  serve.read(line.readOrder, (scope, { params }) => orderPage(scope, params.orderId));
  serve.write(line.addOrder, (scope, { body }) => makeOrder(scope, body));
  serve.write(line.changeOrder, (scope, { params, body }) => changeOne(scope, params.orderId, body));
  serve.write(line.changeLine, (scope, { params, body }) => changeOneLine(scope, params, body));
  serve.write(line.moveOrder, (scope, { params, body }) => move(scope, params.orderId, body));
  serve.write(line.cancelOrder, (scope, { params, body }) => cancel(scope, params.orderId, body));
  serve.write(line.offerTimes, (scope, { params, body }) => offer(scope, params.orderId, body));
  serve.write(line.agreeTime, (scope, { params, body }) => agree(scope, params.orderId, body));
  serve.write(line.sendMessage, (scope, { params, body }) => addMessage(scope, params.orderId, body, false));
  serve.write(line.markRead, async (scope, { params }) => {
    await readMessages(scope, params.orderId);
    return DONE;
  });
  serve.work(line.handOver, (scope, { params, body }) => giveOver(scope, params.orderId, body));
  serve.write(line.returnFish, (scope, { params, body }) => takeBack(scope, params.orderId, body));
  serve.write(line.bookLoss, (scope, { params, body }) => bookDeaths(scope, params.orderId, body));
  serve.write(line.recordPayment, (scope, { params, body }) => bookByHand(scope, params.orderId, body));
  serve.work(line.giveBack, (scope, { params, body }) => payBack(scope, params.orderId, body));
  serve.read(line.printReceipt, (scope, { params }, { res }) => sendReceipt(scope, params.orderId, params.paper, res));
  serve.read(line.previewLetter, (scope, { params, query }) => letterPreview(scope, params.orderId, query.kind));
  serve.read(line.readTerms, (scope) => termsPage(scope));
  serve.write(line.changeTerms, (scope, { body }) => setTerms(scope, body));
  serve.read(listBuyerNames, async (scope) => ({ buyers: await buyerNames(scope) }));
  serve.write(addBuyerName, (scope, { body }) => addName(scope, body));
  serve.read(readBooks, (scope, { query }) => booksPage(scope, query.year));
  serve.read(exportBooks, (scope, { query }, { res }) => sendBooks(scope, query.year, res));
  serve.read(exportBuyer, (scope, { params }, { res }) => sendBuyer(scope, params.buyerId, res));
  serve.write(eraseBuyer, async (scope, { params }) => {
    await erase(scope, params.buyerId);
    return DONE;
  });
}
