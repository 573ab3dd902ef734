import { useState } from 'react';

/** The secret word behind the # of a letter's link, taken out of the address bar and the history at once. */
export function useLinkToken(): string {
  const [token] = useState(() => {
    const { location, history } = globalThis;
    const word = location?.hash.slice(1) ?? '';
    if (word) history.replaceState(history.state, '', location.pathname + location.search);
    return word;
  });
  return token;
}
