import { limitOf } from '../http/limitOf';

export type Limits = ReturnType<typeof openLimits>;

/** One set for an app. They live in memory: a restart forgets them, and only one process serves a data folder. */
export function openLimits() {
  return {
    /** Wrong passwords and codes, by account: whoever knows of it and wherever they are. */
    wrongForAccount: limitOf(20, 15, { failuresOnly: true }),
    wrongFromAddress: limitOf(100, 15, { failuresOnly: true }),
    wrongCode: limitOf(10, 15, { failuresOnly: true }),
    signUpFromAddress: limitOf(30, 60),
    lettersToAddress: limitOf(6, 60),
    lettersFromAddress: limitOf(60, 60),
    linksFromAddress: limitOf(60, 15, { failuresOnly: true }),
  };
}
