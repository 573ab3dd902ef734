import type { About } from '../../shared/record/contract';
import type { Scope } from '../scope';

/** What the things of a history are called: their codes; '?' for one without. */
export async function codesOf({ db, roomId }: Scope, about: About[]): Promise<(id: string) => string> {
  const codes = new Map<string, string>();
  for (const thing of ['tank', 'colony', 'fish', 'brood', 'strain'] as const) {
    const ids = [...new Set(about.filter((one) => one.thing === thing).map(({ id }) => id))];
    if (ids.length === 0) continue;
    const rows = await db
      .selectFrom(thing)
      .where('roomId', '=', roomId)
      .where('id', 'in', ids)
      .select(['id', 'code'])
      .execute();
    for (const { id, code } of rows) if (code) codes.set(id, code);
  }
  return (id) => codes.get(id) ?? '?';
}
