/** "4" and "7" make "47". ".5" ends a number; a point comes once and takes two digits after it. */
export function withKey(value: string, key: string, digits: number, extra: '.5' | '.'): string {
  if (key === '.') return value === '' || value.includes('.') ? value : value + extra;
  const [whole = '', part] = value.split('.');
  if (part === undefined) return whole === '0' ? key : whole.length >= digits ? value : value + key;
  return extra === '.5' || part.length >= 2 ? value : value + key;
}
