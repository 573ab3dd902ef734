import { useState } from 'react';

const kept = new Map<string, unknown>();

/**
 * State that outlives its page until it is forgotten: what was begun stands there again when the keeper comes back. `is`
 * knows its own shape again.
 */
export function useKept<Value>(key: string, start: () => Value, is: (value: unknown) => value is Value) {
  const [value, setValue] = useState<Value>(() => {
    const before = kept.get(key);
    return is(before) ? before : start();
  });
  const set = (next: Value) => {
    kept.set(key, next);
    setValue(next);
  };
  return [value, set, () => kept.delete(key)] as const;
}
