import * as own from '../../shared/orders/own';
import type { Serve } from '../http/serve';
import { checkoutOf } from './checkout';
import { cancelOwn, ownOrder, ownOrders, ownPage, pickTime, writeMessage } from './own';
import { sendReceipt } from './receipt';

/** The buyer's side, by the link or by an account. */
export function ownRoutes(serve: Serve): void {
  serve.open(own.readOwnOrder, async (asked, { params }, { res }) => ownPage(await ownOrder(asked, params.token, res)));
  serve.open(own.payOwnOrder, async (asked, { params }, { res }) => {
    const { scope, orderId } = await ownOrder(asked, params.token, res);
    return checkoutOf(scope, orderId, params.token);
  });
  serve.open(own.pickOwnTime, async (asked, { params, body }, { res }) =>
    pickTime(await ownOrder(asked, params.token, res), body.time),
  );
  serve.open(own.writeOwnMessage, async (asked, { params, body }, { res }) =>
    writeMessage(await ownOrder(asked, params.token, res), body),
  );
  serve.open(own.cancelOwnOrder, async (asked, { params, body }, { res }) =>
    cancelOwn(await ownOrder(asked, params.token, res), body.because),
  );
  serve.open(own.printOwnReceipt, async (asked, { params }, { res }) => {
    const { scope, orderId } = await ownOrder(asked, params.token, res);
    return sendReceipt(scope, orderId, params.paper, res);
  });
  serve.signedIn(own.listOwnOrders, (asked) => ownOrders(asked));
}
