import { Refusal } from '../../shared/refusal';
import { mustBeOurs } from '../fish';
import type { KindRules } from '../record/kinds';

/** A photo's row. The files are there already: `server/photos` stored them before the transaction began. */
export const photoKinds: Pick<KindRules, 'photoTaken'> = {
  photoTaken: {
    async store(scope, { photoId, of, takenOn, caption }, { entryId, picture }) {
      const { db, roomId, actorId, now, today } = scope;
      if (!picture)
        throw new Refusal('invalid', 'A photo comes with its picture', { kind: 'Send it with its picture' });
      await mustBeOurs(scope, of.thing, of.id, 'of.id', `Choose a ${of.thing}`);
      const day = takenOn ?? (picture.takenOn && picture.takenOn <= today ? picture.takenOn : today);
      const { takenAt, width, height, bytes, sha256 } = picture;
      await db
        .insertInto('photo')
        .values({
          roomId,
          id: photoId,
          fishId: null,
          broodId: null,
          batchId: null,
          colonyId: null,
          holdId: null,
          tankId: null,
          [`${of.thing}Id`]: of.id,
          takenOn: day,
          takenAt,
          caption,
          width,
          height,
          bytes,
          sha256,
          actorId,
          entryId,
          createdAt: now,
        })
        .execute();
      return { onDay: day, about: [of], made: { photo: photoId } };
    },
    say: ({ caption }) => (caption ? `Photo: ${caption}` : 'Photo'),
  },
};
