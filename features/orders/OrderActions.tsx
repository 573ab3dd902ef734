import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { Menu, type MenuItem } from '@/components/ui/Menu';
import { Notice } from '@/components/ui/Notice';
import { Sheet } from '@/components/ui/Sheet';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { moveOrder, type OrderPage } from '@/shared/orders/contract';
import { hasLeft, MOVE_WORDS, movesOf, type OrderMove } from '@/shared/orders/state';
import { may } from '@/shared/roles';
import { AfterSheet } from './AfterSheet';
import { CancelSheet } from './CancelSheet';
import { ChangeSheet } from './ChangeSheet';
import { DepositSheet } from './DepositSheet';
import { HandOverSheet } from './HandOverSheet';
import { useAct } from './queries';

type Open = 'deposit' | 'handOver' | 'cancel' | 'change' | 'returned' | 'lost';

/** The next step as a button, everything else in the menu; what a role may not do is not there. */
export function OrderActions({ told }: { told: OrderPage }) {
  const room = useRoom();
  const act = useAct();
  const [open, setOpen] = useState<Open | null>(null);
  const { order } = told;
  const close = () => setOpen(null);
  const sells = may(room.role, 'sale:write');
  const moves = movesOf(order);
  const run = (move: 'reserve' | 'forgoDeposit' | 'markReady' | 'close') =>
    act.mutate(() =>
      call(moveOrder, {
        params: { roomId: room.id, orderId: order.id },
        body: { version: order.version, move, depositCents: null },
      }),
    );
  const doing: Partial<Record<OrderMove, () => void>> = {
    ...(sells
      ? {
          reserve: () => run('reserve'),
          askDeposit: () => setOpen('deposit'),
          forgoDeposit: () => run('forgoDeposit'),
          markReady: () => run('markReady'),
          close: () => run('close'),
          cancel: () => setOpen('cancel'),
        }
      : {}),
    collect: () => setOpen('handOver'),
  };
  const next = nextMove(moves, order.toPayCents);
  const items = menuOf(moves, { next, doing });
  if (hasLeft(order.state)) items.push({ word: 'Fish came back', onPress: () => setOpen('returned') });
  if (hasLeft(order.state) && sells) items.push({ word: 'Fish died on the way', onPress: () => setOpen('lost') });
  if (sells && order.state !== 'closed' && order.state !== 'cancelled')
    items.push({ word: 'Discount and note', onPress: () => setOpen('change') });
  const first = next && doing[next];
  return (
    <>
      {first ? <Button kind="primary" small label={MOVE_WORDS[next]} busy={act.isPending} onPress={first} /> : null}
      {items.length > 0 ? <Menu label="More" items={items} /> : null}
      {open === 'deposit' ? <DepositSheet told={told} onClose={close} /> : null}
      {open === 'handOver' ? <HandOverSheet told={told} onClose={close} /> : null}
      {open === 'cancel' ? <CancelSheet told={told} onClose={close} /> : null}
      {open === 'change' ? <ChangeSheet told={told} onClose={close} /> : null}
      {open === 'returned' || open === 'lost' ? <AfterSheet told={told} what={open} onClose={close} /> : null}
      {act.error ? (
        <Sheet open title="That did not work" onClose={act.reset}>
          <Notice tone="look" alert words={act.error.message} />
        </Sheet>
      ) : null}
    </>
  );
}

const NEXT: readonly OrderMove[] = ['reserve', 'askDeposit', 'markReady', 'collect', 'close'];

/** A gift, or what is paid already, needs no deposit. */
const nextMove = (moves: OrderMove[], toPayCents: number | null): OrderMove | undefined =>
  NEXT.find((move) => moves.includes(move) && (move !== 'askDeposit' || toPayCents !== 0));

type Doing = { next: OrderMove | undefined; doing: Partial<Record<OrderMove, () => void>> };

const menuOf = (moves: OrderMove[], { next, doing }: Doing): MenuItem[] =>
  moves.flatMap((move) => {
    const onPress = doing[move];
    return onPress && move !== next ? [{ word: MOVE_WORDS[move], onPress }] : [];
  });
