import { writeFile } from 'node:fs/promises';
import { EntryContent } from '../../shared/record/kinds';
import { inTransaction } from '../http/serve';
import { whileDrawing } from '../pictures';
import { keepEntry } from '../record';
import { draw, jpegOf } from './drawings';
import { withIds } from './ids';
import { type Loading, scopeOf } from './load';
import type { Recorded } from './scenario/shape';

const isPhoto = (happening: { what: string }): happening is Recorded => happening.what === 'entry';

/** Paints the demo's photographs one after the other while people already look round; stops when told to. */
export async function paintPhotos(loading: Loading, isStopped: () => boolean): Promise<number> {
  let painted = 0;
  for (const happening of loading.scenario.happenings.filter(isPhoto)) {
    if (isStopped()) break;
    const { entry, picture } = happening;
    if (entry.kind !== 'photoTaken' || !picture) continue;
    await paintOne(loading, happening, picture);
    painted += 1;
  }
  return painted;
}

async function paintOne(
  loading: Loading,
  { entry, by, on, time }: Recorded,
  picture: NonNullable<Recorded['picture']>,
): Promise<void> {
  const { house, roomId, idOf } = loading;
  const content = EntryContent.parse(withIds(entry, idOf));
  if (content.kind !== 'photoTaken') return;
  const file = house.pictures.tempPath();
  await writeFile(file, await whileDrawing(() => jpegOf(draw(picture.drawing), picture)));
  const stored = await house.pictures.store(file, roomId, content.photoId);
  try {
    const scope = scopeOf({ ...loading, db: house.db }, by, on, time);
    await inTransaction(scope, (inside) =>
      keepEntry(
        inside,
        { id: idOf(`entry ${content.photoId}`), madeAt: scope.now, dependsOn: [], content },
        { picture: stored },
      ),
    );
    stored.keep();
  } catch (error) {
    await stored.discard();
    throw error;
  }
}
