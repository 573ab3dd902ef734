/** ".125"; 0 is 0. */
export const kinshipWord = (f: number): string => (f < 0.0005 ? '0' : f.toFixed(3).replace(/^0/, ''));
