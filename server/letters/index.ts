import type { Feature } from '../features';
import { startOutbox } from '../mail/outbox';
import { devLetterPages } from './devPages';

export const letters: Feature = { pages: devLetterPages, start: async (house) => startOutbox(house) };
