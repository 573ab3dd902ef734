import { audit } from '../db/audit';
import type { Scope } from '../scope';

type InRoom = Pick<Scope, 'db' | 'roomId'>;

/** Whether a sheet names the people that founders and ancestors came from: off until the owner turns it on. */
export async function showsPeople(scope: InRoom): Promise<boolean> {
  return (await settingsOf(scope))['sheetsShowPeople'] === true;
}

export async function setShowsPeople(scope: Scope, showPeople: boolean): Promise<{ showPeople: boolean }> {
  const before = await settingsOf(scope);
  await scope.db
    .updateTable('room')
    .set({ settings: JSON.stringify({ ...before, sheetsShowPeople: showPeople }) })
    .where('id', '=', scope.roomId)
    .execute();
  const change: Record<string, [boolean, boolean]> = {
    sheetsShowPeople: [before['sheetsShowPeople'] === true, showPeople],
  };
  await audit(scope, { action: 'fishroom changed', about: 'fishroom', aboutId: scope.roomId, change });
  return { showPeople };
}

async function settingsOf({ db, roomId }: InRoom): Promise<Record<string, unknown>> {
  const { settings } = await db
    .selectFrom('room')
    .where('id', '=', roomId)
    .select('settings')
    .executeTakeFirstOrThrow();
  return Object(JSON.parse(settings));
}
