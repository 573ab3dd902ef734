import { useState } from 'react';

/**
 * The value, or the last there was: what a form was opened on may leave its list while the form is filled in or saved, and
 * the form must not go with it.
 */
export function useLast<T>(value: T | undefined): T | undefined {
  const [last, setLast] = useState(value);
  if (value !== undefined && value !== last) setLast(value);
  return value ?? last;
}
