import { Refusal } from '../../shared/refusal';

const RETRY_SECONDS = 5;

export const tooBusy = () =>
  new Refusal(
    'busy',
    'Many pictures are arriving at once. Send this one again in a few seconds.',
    {},
    { retryAfter: RETRY_SECONDS },
  );

export const tooLarge = (maxBytes: number) =>
  new Refusal('too-large', `That is over ${Math.floor(maxBytes / 1_000_000)} MB. Send a smaller copy of the picture.`);

export const tooManyPixels = (megapixels: number) =>
  new Refusal('too-large', `That picture has over ${megapixels} million pixels. Send a smaller copy.`);

export const tooHeavy = () =>
  new Refusal(
    'too-large',
    'Reading that picture would take too much memory. Send a smaller copy, or save it as a plain JPEG.',
  );

export const tooLong = (edge: number) =>
  new Refusal('too-large', `That picture is over ${edge} pixels long. Send a smaller copy.`);

export const notAPicture = () =>
  new Refusal('unsupported', 'That file is not a picture that can be read here. Send a JPEG, PNG, WebP or AVIF.');

export const phoneFormat = () =>
  new Refusal(
    'unsupported',
    'HEIC pictures cannot be read here. On an iPhone choose Settings, Camera, Formats, Most Compatible for new photos, ' +
      'and share this one as JPEG.',
  );

export const damaged = () =>
  new Refusal('invalid', 'That picture is damaged or cut off. Send it again, or take it again.', {
    picture: 'The picture is damaged or cut off',
  });

export const noPicture = () =>
  new Refusal('invalid', 'No picture arrived. Choose one and send it again.', { picture: 'Choose a picture' });

export const notWhole = () => new Refusal('malformed', 'The picture did not arrive whole. Send it again.');

export const oneAtATime = () => new Refusal('malformed', 'Send one picture at a time.');

export const oddForm = () => new Refusal('malformed', 'The form that came with the picture could not be read.');

export const anotherPicture = () =>
  new Refusal('conflict', 'Another picture is stored under this id. Both are kept: send this one under a new id.');

const diskFull = () =>
  new Refusal('full', 'The disk of this server is full, so the picture was not saved. Tell whoever runs the server.');

const NO_SPACE = new Set(['ENOSPC', 'EDQUOT']);
const NO_HANDLES = new Set(['EMFILE', 'ENFILE']);

export const codeOf = (error: unknown): string => (error instanceof Error && 'code' in error ? String(error.code) : '');

/** What a failed write means to the keeper; anything unforeseen passes through as itself. */
export function diskRefusal(error: unknown): unknown {
  if (NO_SPACE.has(codeOf(error))) return diskFull();
  return NO_HANDLES.has(codeOf(error)) ? tooBusy() : error;
}

/** Throws unless a fishroom whose pictures take `used` bytes may take `added` more. */
export function mustFitQuota({ used, added, quota }: { used: number; added: number; quota: number }): void {
  if (used + added > quota)
    throw new Refusal(
      'full',
      `The pictures of this fishroom fill its ${Math.floor(quota / 1_000_000)} MB. Delete some, or ask whoever runs the server for more.`,
    );
}
