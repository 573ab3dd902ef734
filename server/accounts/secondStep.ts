import { createHash, randomBytes } from 'node:crypto';
import { generateSecret, generateURI, verify } from 'otplib';
import QRCode from 'qrcode';
import type * as z from 'zod/mini';
import type { startSecondStep } from '../../shared/accounts/security';
import { qrRuns } from '../../shared/print/qrRuns';
import { Refusal } from '../../shared/refusal';
import { seal, unseal } from '../db/seal';
import type { Asked, SignedIn } from '../scope';
import { accountOf } from './accounts';
import { sendNotice } from './letters';

const PURPOSE = 'authenticator';
/** A code is good for its own half minute and the one before and after: clocks differ. RFC 6238, section 5.2. */
const TOLERANCE_S = 30;
const RECOVERY_CODES = 10;

const wrongCode = () => new Refusal('forbidden', 'That code is not right', { code: 'That code is not right' });

/** A fresh secret, kept beside the account but not in force. */
export async function proposeSecret(asked: SignedIn): Promise<z.input<typeof startSecondStep.output>> {
  const account = await accountOf(asked);
  if (account.totpEnabledAt) throw new Refusal('conflict', 'The second step is on already. Turn it off first.');
  const secret = generateSecret();
  const totpSecret = seal(asked.house.config, PURPOSE, secret);
  await asked.db.updateTable('account').set({ totpSecret }).where('id', '=', account.id).execute();
  const address = generateURI({ issuer: 'Kinwater', label: account.email, secret });
  return { secret, address, square: squareOf(address) };
}

function squareOf(address: string) {
  const { modules } = QRCode.create(address, { errorCorrectionLevel: 'M' });
  const bars = qrRuns(modules.size, (row, column) => Boolean(modules.get(row, column)));
  return { size: modules.size, bars };
}

/** In force from the first right code on. Answers the recovery codes, once. */
export async function turnOn(asked: SignedIn, code: string): Promise<string[]> {
  const account = await accountOf(asked);
  if (account.totpEnabledAt) throw new Refusal('conflict', 'The second step is on already');
  return asked.db.transaction().execute(async (db) => {
    const inside = { ...asked, db };
    await mustBeTotp(inside, account.id, code);
    await db.updateTable('account').set({ totpEnabledAt: asked.now }).where('id', '=', account.id).execute();
    await sendNotice(inside, account, 'Signing in has a second step', [
      `From now on ${account.name} signs in with a code of the authenticator as well.`,
      'If that was not you, ask for a new password at once.',
    ]);
    return newRecoveryCodes(inside, account.id);
  });
}

export async function turnOff(asked: SignedIn, code: string): Promise<void> {
  const account = await mustHaveSecondStep(asked);
  await asked.db.transaction().execute(async (db) => {
    const inside = { ...asked, db };
    await mustBeCode(inside, account.id, code);
    await db
      .updateTable('account')
      .set({ totpSecret: null, totpEnabledAt: null, totpLastStep: null })
      .where('id', '=', account.id)
      .execute();
    await db.deleteFrom('recoveryCode').where('accountId', '=', account.id).execute();
    await sendNotice(inside, account, 'The second step was turned off', [
      `${account.name} signs in without a code of the authenticator from now on.`,
      'If that was not you, change your password at once.',
    ]);
  });
}

export async function renewCodes(asked: SignedIn, code: string): Promise<string[]> {
  const account = await mustHaveSecondStep(asked);
  return asked.db.transaction().execute(async (db) => {
    const inside = { ...asked, db };
    await mustBeCode(inside, account.id, code);
    return newRecoveryCodes(inside, account.id);
  });
}

async function mustHaveSecondStep(asked: SignedIn) {
  const account = await accountOf(asked);
  if (!account.totpEnabledAt) throw new Refusal('conflict', 'The second step is not on');
  return account;
}

/** A code of the authenticator or a recovery code, used up by this. Inside a transaction. */
export async function mustBeCode(inside: Asked, accountId: string, typed: string): Promise<void> {
  if (/^[\d ]{6,7}$/.test(typed)) return mustBeTotp(inside, accountId, typed);
  const used = await inside.db
    .updateTable('recoveryCode')
    .set({ usedAt: inside.now })
    .where('accountId', '=', accountId)
    .where('codeHash', '=', hashOfCode(typed))
    .where('usedAt', 'is', null)
    .returning('codeHash')
    .executeTakeFirst();
  if (!used) throw wrongCode();
}

async function mustBeTotp({ db, house, now }: Asked, accountId: string, typed: string): Promise<void> {
  const { totpSecret, totpLastStep } = await db
    .selectFrom('account')
    .where('id', '=', accountId)
    .select(['totpSecret', 'totpLastStep'])
    .executeTakeFirstOrThrow();
  const secret = totpSecret && unseal(house.config, PURPOSE, totpSecret);
  const token = typed.replaceAll(' ', '');
  if (!secret || !/^\d{6}$/.test(token)) throw wrongCode();
  const result = await verify({
    secret,
    token,
    epoch: Math.floor(Date.parse(now) / 1000),
    epochTolerance: TOLERANCE_S,
    // A code that was used, and every earlier one, is dead.
    ...(totpLastStep === null ? {} : { afterTimeStep: totpLastStep }),
  });
  if (!result.valid || !('timeStep' in result)) throw wrongCode();
  await db.updateTable('account').set({ totpLastStep: result.timeStep }).where('id', '=', accountId).execute();
}

/** 80 bits each: too many to guess, so a plain hash keeps them. */
const hashOfCode = (typed: string): string =>
  createHash('sha256')
    .update(typed.toLowerCase().replace(/[^a-z2-7]/g, ''))
    .digest('hex');

const LETTERS = 'abcdefghijklmnopqrstuvwxyz234567';
const newCode = (): string =>
  Array.from(randomBytes(16), (byte) => LETTERS[byte % 32])
    .join('')
    .replace(/(.{4})(?=.)/g, '$1-');

async function newRecoveryCodes({ db }: Asked, accountId: string): Promise<string[]> {
  const codes = Array.from({ length: RECOVERY_CODES }, newCode);
  await db.deleteFrom('recoveryCode').where('accountId', '=', accountId).execute();
  await db
    .insertInto('recoveryCode')
    .values(codes.map((code) => ({ accountId, codeHash: hashOfCode(code), usedAt: null })))
    .execute();
  return codes;
}
