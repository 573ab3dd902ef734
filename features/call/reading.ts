import { answersStore } from './answersStore';
import { LARGE } from './largeLines';

/** `place`: where the answer is kept on this device, its account's own. `has`: the turn of it that the page has. */
export type Asked = { path: string; address: string; place: string; has: number | null };

export type Told =
  /** `data` without the rows of its long list, which are handed over bit by bit. */
  | { as: 'read' | 'kept'; turn: number; data: object; list: string; rows: number }
  /** What the page has still holds. */
  | { as: 'same' }
  | { as: 'refused'; status: number; body: unknown }
  | { as: 'unreachable' };

type Turn = { turn: number; text: string; rows: unknown[] };

/** What was last told of each place, with the rows that the page has not taken yet. */
const told = new Map<string, Turn>();
let turns = 0;

/** Fetches a large answer, checks it by its contract and keeps it on the device. Runs in a worker. */
export async function readLarge({ path, address, place, has }: Asked): Promise<Told> {
  const answer = await fetch(address, { credentials: 'same-origin' }).catch(() => null);
  if (!answer) return { as: 'unreachable' };
  if (!answer.ok) return { as: 'refused', status: answer.status, body: await answer.json().catch(() => null) };
  const text = await answer.text();
  const last = told.get(place);
  if (last && last.turn === has && last.text === text) return { as: 'same' };
  const now = checked(path, place, text);
  void answersStore.put(place, text);
  return { as: 'read', ...now };
}

/** What this device keeps of it; nothing where another build kept it in another shape. */
export async function readKept({ path, place }: Asked): Promise<Told> {
  const text = await answersStore.get(place);
  if (text === undefined) return { as: 'unreachable' };
  try {
    return { as: 'kept', ...checked(path, place, text) };
  } catch {
    return { as: 'unreachable' };
  }
}

/** The next rows of a turn; few enough at a time that taking them over is not felt. Nothing of a turn that is past. */
export function takeRows(place: string, turn: number, count: number): unknown[] | null {
  const last = told.get(place);
  return last?.turn === turn ? last.rows.splice(0, count) : null;
}

function checked(path: string, place: string, text: string) {
  const line = LARGE.find((one) => one.path === path);
  if (!line) throw new Error(`${path} is not among the large answers`);
  const data: Record<string, unknown> = line.output.parse(JSON.parse(text));
  const [list, rows] = Object.entries(data).find(([, value]) => Array.isArray(value)) ?? [];
  if (!list || !Array.isArray(rows)) throw new Error(`${path} has no list`);
  turns += 1;
  told.set(place, { turn: turns, text, rows });
  return { turn: turns, data: { ...data, [list]: [] }, list, rows: rows.length };
}
