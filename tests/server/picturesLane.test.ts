import { describe, expect, test } from 'vitest';
import { openLane } from '@/server/pictures/lane';

describe('the line before the darkroom', () => {
  const gate = () => {
    let open = () => {};
    const opened = new Promise<void>((done) => {
      open = done;
    });
    return { open, opened };
  };
  const turn = () => new Promise((later) => setImmediate(later));

  test('works on two at once, in the order of arrival', async () => {
    const lane = openLane({ places: 2, waiting: 9 });
    const gates = [gate(), gate(), gate(), gate()];
    const begun: number[] = [];
    const all = gates.map((one, i) =>
      lane.run(1, async () => {
        begun.push(i);
        await one.opened;
      }),
    );
    await turn();
    expect(begun).toEqual([0, 1]);
    gates[1]?.open();
    await turn();
    expect(begun).toEqual([0, 1, 2]);
    for (const one of gates) one.open();
    await Promise.all(all);
    expect(begun).toEqual([0, 1, 2, 3]);
  });

  test('lets a heavy one work alone, and none overtake it', async () => {
    const lane = openLane({ places: 2, waiting: 9 });
    const gates = [gate(), gate(), gate()];
    const begun: number[] = [];
    const all = gates.map((one, i) =>
      lane.run(i === 1 ? 2 : 1, async () => {
        begun.push(i);
        await one.opened;
      }),
    );
    await turn();
    expect(begun).toEqual([0]);
    gates[0]?.open();
    await turn();
    expect(begun).toEqual([0, 1]);
    gates[1]?.open();
    await turn();
    expect(begun).toEqual([0, 1, 2]);
    gates[2]?.open();
    await Promise.all(all);
  });

  test('sends away whoever finds it full, and goes on after a failure', async () => {
    const lane = openLane({ places: 1, waiting: 1 });
    const { open, opened } = gate();
    const first = lane.run(1, async () => {
      await opened;
      throw new Error('spoiled');
    });
    const second = lane.run(1, async () => 'done');
    expect(lane.isFull()).toBe(true);
    await expect(lane.run(1, async () => 'late')).rejects.toMatchObject({ reason: 'busy', retryAfter: 5 });
    open();
    await expect(first).rejects.toThrow('spoiled');
    expect(await second).toBe('done');
    expect(lane.isFull()).toBe(false);
  });
});
