import {
  changeEmail,
  changePassword,
  endOneSession,
  endOtherSessions,
  listSessions,
  renewRecoveryCodes,
  startSecondStep,
  turnOffSecondStep,
  turnOnSecondStep,
} from '../../shared/accounts/security';
import { DONE } from '../../shared/endpoint';
import type { Serve } from '../http/serve';
import type { Limits } from './limits';
import { endSessionsOf } from './links';
import { proposeSecret, renewCodes, turnOff, turnOn } from './secondStep';
import { askToChangeEmail, endOne, mustKnowPassword, sessionsOf, setPassword } from './security';

/** Password, address, sign-ins and second step of whoever is signed in. */
export function securityRoutes(serve: Serve, limits: Limits): void {
  serve.signedIn(changePassword, async (asked, { body }, raw) => {
    await limits.wrongForAccount(raw, asked.accountId);
    await setPassword(asked, body);
    return DONE;
  });
  serve.signedIn(changeEmail, async (asked, { body }, raw) => {
    await limits.wrongForAccount(raw, asked.accountId);
    await limits.lettersFromAddress(raw);
    await askToChangeEmail(asked, body);
    return DONE;
  });
  serve.signedIn(listSessions, async (asked) => ({ sessions: await sessionsOf(asked) }));
  serve.signedIn(endOneSession, async (asked, { params }) => {
    await endOne(asked, params.sessionId);
    return DONE;
  });
  serve.signedIn(endOtherSessions, async (asked) => {
    await endSessionsOf(asked, asked.accountId, asked.sessionId);
    return DONE;
  });
  serve.signedIn(startSecondStep, async (asked, { body }, raw) => {
    await limits.wrongForAccount(raw, asked.accountId);
    await mustKnowPassword(asked, body.current);
    return proposeSecret(asked);
  });
  serve.signedIn(turnOnSecondStep, async (asked, { body }, raw) => {
    await limits.wrongCode(raw, asked.accountId);
    return { recoveryCodes: await turnOn(asked, body.code) };
  });
  serve.signedIn(turnOffSecondStep, async (asked, { body }, raw) => {
    await limits.wrongCode(raw, asked.accountId);
    await turnOff(asked, body.code);
    return DONE;
  });
  serve.signedIn(renewRecoveryCodes, async (asked, { body }, raw) => {
    await limits.wrongCode(raw, asked.accountId);
    return { recoveryCodes: await renewCodes(asked, body.code) };
  });
}
