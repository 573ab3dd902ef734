import type * as z from 'zod/mini';
import type { Endpoint } from '@/shared/endpoint';
import { isReason, Refusal } from '@/shared/refusal';
import { placeOfAnswer } from './call/keptAnswers';
import { isLarge, readLarge } from './call/large';

type Shape = z.ZodMiniType;
type Sent<P extends Shape, Q extends Shape, B extends Shape> = {
  params?: z.input<P>;
  query?: z.input<Q>;
  body?: z.input<B>;
  signal?: AbortSignal;
};

/** The only fetch of the browser. It has no opinions: what the server refuses is thrown as the same `Refusal`. */
export async function call<P extends Shape, Q extends Shape, B extends Shape, O extends Shape>(
  line: Endpoint<P, Q, B, O>,
  sent: Sent<P, Q, B> = {},
): Promise<z.output<O>> {
  const address = addressOf(line, sent);
  const place = isLarge(line) ? placeOfAnswer(address) : null;
  if (place !== null) return await largeAnswer(line, address, place);
  const writes = line.method !== 'GET';
  const answer = await reach(address, {
    method: line.method,
    credentials: 'same-origin',
    signal: sent.signal ?? null,
    ...(writes && sent.body !== undefined
      ? { body: JSON.stringify(sent.body), headers: { 'content-type': 'application/json' } }
      : {}),
  });
  if (!answer.ok) throw await refusalOf(answer);
  return line.output.parse(await answer.json());
}

async function largeAnswer<O extends Shape>(
  line: { path: string; output: O },
  address: string,
  place: string,
): Promise<z.output<O>> {
  const told = await readLarge(line, address, place);
  if (told.as === 'unreachable') throw new Unreachable(NOT_HERE);
  if (told.as === 'refused') throw await refusalOf({ status: told.status, json: async () => told.body });
  return told.data;
}

/** No signal, or no server: worth trying again, unlike a refusal. */
export class Unreachable extends Error {
  override readonly name = 'Unreachable';
}

const NOT_HERE = 'No signal, and this is not on this device yet. Open it once with a signal; then it stays here.';
const NOT_SENT = 'No signal. Nothing was sent. Try again when it is back.';

async function reach(address: string, request: RequestInit): Promise<Response> {
  try {
    return await fetch(address, request);
  } catch (error) {
    if (request.signal?.aborted) throw error;
    throw new Unreachable(request.method === 'GET' ? NOT_HERE : NOT_SENT);
  }
}

/** The address of an endpoint with its parameters and query, for links and pictures as well as for calls. */
export function addressOf<P extends Shape, Q extends Shape>(
  line: Pick<Endpoint<P, Q>, 'path'>,
  sent: { params?: z.input<P>; query?: z.input<Q> } = {},
): string {
  const params = new Map(Object.entries(sent.params ?? {}));
  const path = line.path.replace(/:([A-Za-z]+)/g, (_all, name: string) =>
    encodeURIComponent(String(params.get(name) ?? '')),
  );
  const query = new URLSearchParams();
  for (const [key, value] of Object.entries(sent.query ?? {})) if (value !== undefined) query.set(key, String(value));
  const text = query.toString();
  return text ? `${path}?${text}` : path;
}

/** The refusal in an answer that is not ok; also used for uploads, which report their progress by other means. */
export async function refusalOf(answer: { status: number; json(): Promise<unknown> }): Promise<Refusal> {
  const body: unknown = await answer.json().catch(() => null);
  const error = isRecord(body) && isRecord(body['error']) ? body['error'] : {};
  const reason = typeof error['reason'] === 'string' && isReason(error['reason']) ? error['reason'] : 'broken';
  const message =
    typeof error['message'] === 'string' ? error['message'] : 'Something went wrong. Nothing was saved. Try again.';
  const fields = isRecord(error['fields'])
    ? Object.fromEntries(Object.entries(error['fields']).map(([key, value]) => [key, String(value)]))
    : {};
  const requestId = typeof error['requestId'] === 'string' ? error['requestId'] : undefined;
  return new Refusal(reason, message, fields, { current: error['current'], ...(requestId ? { requestId } : {}) });
}

const isRecord = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null;
