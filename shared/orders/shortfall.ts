export type Claim = { id: string; heads: number };

/**
 * Who falls short when fewer fish live than are held: whoever came first is served first, so the latest go without. Claims
 * come in the order in which they were made; only those that fall short are answered.
 */
export function shortfalls(heads: number, claims: Claim[]): Map<string, number> {
  const short = new Map<string, number>();
  let left = Math.max(0, heads);
  for (const claim of claims) {
    const missing = Math.max(0, claim.heads - left);
    left = Math.max(0, left - claim.heads);
    if (missing > 0) short.set(claim.id, (short.get(claim.id) ?? 0) + missing);
  }
  return short;
}
