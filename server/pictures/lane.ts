import { tooBusy } from './refusals';

export type Lane = {
  /** Waits its turn, in order of arrival; refuses at once when the waiting line is full. */
  run<T>(places: number, work: () => Promise<T>): Promise<T>;
  isFull(): boolean;
};

/** `places`: how much may be worked on at once; heavy work takes several. `waiting`: how many may stand in line. */
export function openLane({ places, waiting }: { places: number; waiting: number }): Lane {
  const line: { places: number; start: () => void }[] = [];
  let free = places;

  const callNext = () => {
    for (let first = line[0]; first && first.places <= free; first = line[0]) {
      line.shift();
      free -= first.places;
      first.start();
    }
  };

  return {
    isFull: () => line.length >= waiting,
    async run(wanted, work) {
      if (line.length >= waiting) throw tooBusy();
      const taken = Math.min(wanted, places);
      await new Promise<void>((start) => {
        line.push({ places: taken, start });
        callNext();
      });
      try {
        return await work();
      } finally {
        free += taken;
        callNext();
      }
    },
  };
}
