import { between, chanceOf } from '../drawings/chance';
import { type Started, samplesOf } from './broodTelling';
import { meanLengthAt, vigourOf } from './growth';
import { overRuler, PHOTOS, type PhotoStory, tray } from './photos';
import type { Ago, Recorded } from './shape';
import type { Teller } from './telling';

/** Broods that are photographed over the ruler, with the width in mm that all their pictures keep. */
const FOLLOWED: Readonly<Record<string, number>> = {
  m1: 64,
  m3: 64,
  m4: 40,
  l4: 64,
  l5: 48,
  e3: 80,
  e4: 32,
  s5: 48,
  c2: 80,
  a2: 48,
};
/** Broods whose young were photographed in the tray as they came. */
const IN_TRAY = new Set(['m1', 'm4', 'l2', 'e1', 'e4', 's1', 's6', 'f1']);
const MOST_IN_TRAY = 24;

type Joined = { age: number; heads: number } | null;

/** Every second sample of a followed brood has its picture: one fish of about the mean length. */
function followed({ handle, strain, born, ...started }: Started, joined: Joined): PhotoStory[] {
  const spanMm = FOLLOWED[handle];
  if (!spanMm) return [];
  return samplesOf({ handle, strain, born, ...started }, joined)
    .filter((_, i) => i % 2 === 0 || i === 1)
    .map(({ age }, i): PhotoStory => {
      const near = between(chanceOf(`${handle} photo ${age}`), 0.97, 1.03);
      const lengthMm = Math.round(2 * near * meanLengthAt(strain, age, vigourOf(handle))) / 2;
      return {
        of: { thing: 'brood', key: `brood:${handle}` },
        on: born + age,
        caption: `${lengthMm} mm`,
        orientation: i % 3 === 2 ? 3 : 1,
        drawing: overRuler(strain, `${handle} ${age}`, { lengthMm, spanMm }),
      };
    });
}

function inTray({ handle, strain, started, brood }: Started): PhotoStory[] {
  if (!IN_TRAY.has(handle)) return [];
  const { total, wrigglers, eggs = 0 } = brood.numbers;
  const count = Math.min(MOST_IN_TRAY, wrigglers ?? total - eggs);
  const lengthMm = meanLengthAt(strain, 18, 0.85);
  return [
    {
      of: { thing: 'brood', key: `brood:${handle}` },
      on: started,
      caption: 'Just out of her mouth',
      drawing: tray(strain, `tray ${handle}`, {
        life: 'yolk-fry',
        count,
        lengthMm: Math.max(7, Math.round(lengthMm * 10) / 10),
      }),
    },
  ];
}

function told(tell: Teller, { of, on, caption, orientation = 1, drawing }: PhotoStory): Recorded {
  const photo = tell.entry(on, `${of.key} ${drawing.shot}`, {
    kind: 'photoTaken',
    photoId: `photo:${drawing.shot}`,
    of: { thing: of.thing, id: of.key },
    takenOn: null,
    caption,
  });
  return { ...photo, picture: { drawing, takenAt: `${photo.on}T${photo.time}:00`, orientation } };
}

export function tellPhotos(tell: Teller, broods: readonly Started[], joinedOf: (handle: string) => Joined): Recorded[] {
  const ofBroods = broods.flatMap((brood) => [...inTray(brood), ...followed(brood, joinedOf(brood.handle))]);
  const isPast = ({ on }: { on: Ago }) => on < -1;
  return [...PHOTOS, ...ofBroods].filter(isPast).map((photo) => told(tell, photo));
}
