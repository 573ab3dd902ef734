/** "04" of DUMA-A04 where all the fish on the screen are of one colony; the whole code where they are not. */
export function shortCodes(codes: readonly string[]): (code: string) => string {
  const stems = new Set(codes.map((code) => /^(.*[A-Z])\d+$/.exec(code)?.[1] ?? code));
  const [stem] = stems;
  return (code) => (stems.size === 1 && stem && code.startsWith(stem) ? code.slice(stem.length) || code : code);
}
