import type { House } from '../house';

/** At every start: files that no row knows are what a crash left between file and row, and go. */
export async function sweepPictures({ db, pictures, log }: House): Promise<undefined> {
  // Over all fishrooms, since the folder is.
  const known = await db.selectFrom('photo').select(['roomId', 'id']).execute();
  const swept = await pictures.sweep(known);
  log.info({ event: 'swept', swept }, 'pictures swept');
  return undefined;
}
