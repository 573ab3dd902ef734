import { newMailToken } from '../mail/tokens';
import { TOKEN_HERE, writeLetter } from '../mail/writeLetter';
import type { Asked } from '../scope';

type Person = { id: string; email: string; emailFolded: string; name: string };

/** How long a link in a letter is good, in minutes. */
export const GOOD_FOR = { verify: 24 * 60, signIn: 15, reset: 60, changeEmail: 24 * 60 } as const;

/** The word is behind the #, so that it reaches no server's log and no other site. */
const linkTo = ({ house }: Asked, page: string): string => `${house.config.origin}/${page}#${TOKEN_HERE}`;

const NOT_YOU = 'If you did not ask for this, do nothing. Nothing changes without the link.';

export async function sendVerifyLetter(asked: Asked, person: Person): Promise<void> {
  const tokenId = await newMailToken(asked, {
    purpose: 'verify',
    email: person.emailFolded,
    accountId: person.id,
    minutes: GOOD_FOR.verify,
  });
  await writeLetter(asked, {
    kind: 'verify',
    to: person.email,
    toName: person.name,
    subject: 'Confirm your address',
    paragraphs: [`${person.name} signed up for Kinwater with this address.`],
    button: { label: 'Confirm the address', url: linkTo(asked, 'verify') },
    after: ['The link is good for a day. If that was not you, do nothing: the address stays unconfirmed.'],
    tokenId,
  });
}

export async function sendSignInLetter(asked: Asked, person: Person): Promise<void> {
  const tokenId = await newMailToken(asked, {
    purpose: 'signIn',
    email: person.emailFolded,
    accountId: person.id,
    minutes: GOOD_FOR.signIn,
  });
  await writeLetter(asked, {
    kind: 'signIn',
    to: person.email,
    toName: person.name,
    subject: 'Your sign-in link',
    paragraphs: [`Sign in to Kinwater as ${person.name}. The link works once, within ${GOOD_FOR.signIn} minutes.`],
    button: { label: 'Sign in', url: linkTo(asked, 'link') },
    after: [NOT_YOU],
    tokenId,
  });
}

/** Also for a sign-in link to an address that nobody confirmed: whoever reads its post takes the account over. */
export async function sendResetLetter(asked: Asked, person: Person): Promise<void> {
  const tokenId = await newMailToken(asked, {
    purpose: 'reset',
    email: person.emailFolded,
    accountId: person.id,
    minutes: GOOD_FOR.reset,
  });
  await writeLetter(asked, {
    kind: 'reset',
    to: person.email,
    toName: person.name,
    subject: 'Choose a new password',
    paragraphs: [`Choose a new password for ${person.name}. Every device is signed out when it is saved.`],
    button: { label: 'Choose a password', url: linkTo(asked, 'reset') },
    after: ['The link works once, within an hour.', NOT_YOU],
    tokenId,
  });
}

export async function sendChangeEmailLetter(asked: Asked, person: Person, newEmail: string, newFolded: string) {
  const tokenId = await newMailToken(asked, {
    purpose: 'changeEmail',
    email: newFolded,
    accountId: person.id,
    minutes: GOOD_FOR.changeEmail,
    payload: { email: newEmail },
  });
  await writeLetter(asked, {
    kind: 'changeEmail',
    to: newEmail,
    toName: person.name,
    subject: 'Confirm your new address',
    paragraphs: [`${person.name} wants to sign in to Kinwater with this address.`],
    button: { label: 'Confirm the address', url: linkTo(asked, 'verify') },
    after: ['The link is good for a day.', NOT_YOU],
    tokenId,
  });
}

/** After the fact, to whom it concerns: no link in it to press. */
export async function sendNotice(asked: Asked, person: Person, subject: string, paragraphs: string[]): Promise<void> {
  await writeLetter(asked, { kind: 'notice', to: person.email, toName: person.name, subject, paragraphs });
}
