import type { Feature } from '../features';
import { startOutbox } from '../mail/outbox';

export const letters: Feature = { start: async (house) => startOutbox(house) };
