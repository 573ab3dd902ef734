/** Lengths in mm out of pasted text: parted by spaces, lines, semicolons, or commas that a space follows; "33,5" is one. */
export function pastedLengths(text: string): { lengths: number[]; wrong: string[] } {
  const words = text.split(/[\s;]+|,(?=\s)/).filter((word) => word !== '');
  const isLength = (word: string) => /^\d{1,4}(?:[.,]\d)?$/.test(word) && Number(word.replace(',', '.')) > 0;
  return {
    lengths: words.filter(isLength).map((word) => Number(word.replace(',', '.'))),
    wrong: words.filter((word) => !isLength(word)),
  };
}
