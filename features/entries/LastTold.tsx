import { type ReactNode, useState } from 'react';
import { type Told, ToldContext } from '@/features/entries';

/** Remembers what was recorded last, on whatever page it was, so that it can be undone from the next. */
export function LastTold({ children }: { children: ReactNode }) {
  const [told, tell] = useState<Told | null>(null);
  return <ToldContext value={{ told, tell }}>{children}</ToldContext>;
}
