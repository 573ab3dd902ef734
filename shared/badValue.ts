/** A computation was handed a value that it cannot use. `what` names the value in the caller's words. */
export class BadValue extends Error {
  override readonly name = 'BadValue';
  readonly what: string;
  readonly value: unknown;

  constructor(what: string, value: unknown, rule: string) {
    super(`${what}: ${rule}, not ${String(value)}`);
    this.what = what;
    this.value = value;
  }
}

/** `value` itself when it is a finite number within the limits; throws `BadValue` otherwise. */
export function finite(
  what: string,
  value: number,
  limits: { min?: number; max?: number; above?: number } = {},
): number {
  const { min = Number.NEGATIVE_INFINITY, max = Number.POSITIVE_INFINITY, above = Number.NEGATIVE_INFINITY } = limits;
  if (!Number.isFinite(value)) throw new BadValue(what, value, 'a number is needed');
  if (value <= above) throw new BadValue(what, value, `must be above ${above}`);
  if (value < min) throw new BadValue(what, value, `must be at least ${min}`);
  if (value > max) throw new BadValue(what, value, `must be at most ${max}`);
  return value;
}

/** `value` itself when it is a whole number of at least `min`; throws `BadValue` otherwise. */
export function whole(what: string, value: number, min = 0): number {
  if (!Number.isSafeInteger(value)) throw new BadValue(what, value, 'a whole number is needed');
  return finite(what, value, { min });
}
