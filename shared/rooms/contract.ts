import * as z from 'zod/mini';
import { DayText, isTimeZone } from '../days';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { Currency } from '../money';
import { ROLES } from '../roles';
import { line, Version } from '../shapes';
import { UnitChoices } from '../units';

const RoomName = line(80, 'Type the fishroom’s name');

const TimeZone = z
  .string('Choose a time zone')
  .check(z.maxLength(60, 'Choose a time zone'), z.refine(isTimeZone, 'Choose a time zone such as Europe/Oslo'));

/** Where it is, in the keeper's words; an empty one is null. */
const Place = z.nullable(
  z.pipe(
    z.string('Type text').check(z.maxLength(120, 'Keep it under 120 letters')),
    z.transform((text: string) => text.trim() || null),
  ),
);

/** The word in public addresses: small letters, digits and hyphens. */
const Slug = z
  .string('Type a word')
  .check(
    z.regex(/^[a-z0-9]+(?:-[a-z0-9]+)*$/, 'Small letters, digits and hyphens only'),
    z.minLength(3, 'At least three letters'),
    z.maxLength(50, 'At most fifty letters'),
  );

export const RoomDraft = z.strictObject({
  name: RoomName,
  place: Place,
  timeZone: TimeZone,
  currency: Currency,
  units: UnitChoices,
});
export type RoomDraft = z.output<typeof RoomDraft>;

export const RoomPage = z.strictObject({
  id: Id,
  name: z.string(),
  slug: z.string(),
  place: z.nullable(z.string()),
  timeZone: z.string(),
  currency: z.string(),
  units: UnitChoices,
  role: z.enum(ROLES),
  today: DayText,
  createdAt: z.string(),
  version: Version,
});
export type RoomPage = z.output<typeof RoomPage>;

export const createRoom = endpoint({
  method: 'POST',
  path: '/api/rooms',
  needs: 'signedIn',
  body: RoomDraft,
  output: z.strictObject({ id: Id, slug: z.string() }),
});

export const getRoom = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId',
  needs: 'room:see',
  params: inRoom({}),
  output: RoomPage,
});

export const RoomChange = z.strictObject({ ...RoomDraft.shape, slug: Slug, version: Version });

export const changeRoom = endpoint({
  method: 'PATCH',
  path: '/api/rooms/:roomId',
  needs: 'room:manage',
  params: inRoom({}),
  body: RoomChange,
  output: RoomPage,
});
