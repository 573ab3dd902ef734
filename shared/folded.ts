/** Lower case without accents, so that "łąka" is found by "laka". */
export const folded = (text: string): string =>
  text.toLowerCase().normalize('NFD').replace(/\p{M}/gu, '').replace(/ł/g, 'l');
