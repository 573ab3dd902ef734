import type { Href } from 'expo-router';

/** The page to go on to after the door: one of ours, or the beginning. An address of elsewhere is never followed. */
export function nextPage(next: string | undefined): Href {
  const ours = next !== undefined && /^\/(?![/\\])[^\\\s]*$/.test(next);
  return ours ? (next as Href) : '/'; // the router's types list routes, not addresses that were on the way
}
