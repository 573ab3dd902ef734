import { DONE } from '../../shared/endpoint';
import { listLetters, sendLetterAgain } from '../../shared/letters/contract';
import type { Feature } from '../features';
import { startOutbox } from '../mail/outbox';
import { devLetterPages } from './devPages';
import { letterAgain, letterRows } from './letters';

export const letters: Feature = {
  routes: (serve) => {
    serve.read(listLetters, async (scope) => ({ letters: await letterRows(scope) }));
    serve.write(sendLetterAgain, async (scope, { params }) => {
      await letterAgain(scope, params.letterId);
      return DONE;
    });
  },
  pages: devLetterPages,
  start: async (house) => startOutbox(house),
};
