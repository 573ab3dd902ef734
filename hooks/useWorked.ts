import { type UseQueryResult, useQuery } from '@tanstack/react-query';

const numbers = new WeakMap<object, number>();
let next = 1;

/** The same thing has the same number for as long as the page is open. */
export function numberOf(thing: object): number {
  const known = numbers.get(thing);
  if (known !== undefined) return known;
  numbers.set(thing, next);
  next += 1;
  return next - 1;
}

/**
 * What a worker makes of some things, by who they are: worked out once for as long as they are the same; meanwhile nothing.
 * What goes wrong is thrown to the page, as if it had been worked out there.
 */
export function useWorked<Result>(
  word: string,
  of: readonly object[],
  work: () => Promise<Result>,
): UseQueryResult<Result> {
  return useQuery({
    queryKey: ['worked', word, ...of.map(numberOf)],
    queryFn: work,
    staleTime: Number.POSITIVE_INFINITY,
    gcTime: 60_000,
    retry: false,
    structuralSharing: false,
    throwOnError: true,
  });
}
