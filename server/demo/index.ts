import { dayOf } from '../../shared/days';
import type { Feature } from '../features';
import type { House } from '../house';
import { DEMO_PASSWORD, loadDemo } from './load';
import { paintPhotos } from './paint';
import { demoScenario } from './scenario';
import { MEMBERS, ROOM } from './scenario/people';

/** Fills an empty database with the demo fishroom; photographs follow in the background. */
async function start(house: House) {
  if (!house.config.seedDemo) return undefined;
  const anyone = await house.db.selectFrom('account').select('id').limit(1).executeTakeFirst();
  const known = await house.db.selectFrom('room').where('slug', '=', ROOM.slug).select('id').executeTakeFirst();
  if (!anyone || known) house.demoWords = signInWords();
  if (anyone) return undefined;
  const loading = await loadDemo(house, demoScenario(dayOf(house.clock.now().getTime(), ROOM.timeZone)));
  let stopped = false;
  const painting = paintPhotos(loading, () => stopped)
    .then((count) => house.log.info({ event: 'demo painted', count }, 'the demo has its photographs'))
    .catch((error: unknown) =>
      house.log.error({ err: error, event: 'demo painting' }, 'a photograph of the demo was not painted'),
    );
  return {
    stop: async () => {
      stopped = true;
      await painting;
    },
  };
}

const signInWords = (): string =>
  [
    `Demo: ${ROOM.name}. Sign in with the password "${DEMO_PASSWORD}" as`,
    ...MEMBERS.map(({ email, role }) => `  ${email} (${role})`),
  ].join('\n');

export const demo: Feature = { start };
