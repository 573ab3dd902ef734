/** "Maylandia estherae" is "M. estherae" where room is scarce, as printed names are shortened after their first mention. */
export const shortName = (name: string): string => name.replace(/^(\p{Lu})\p{Ll}+ (?=\p{Ll})/u, '$1. ');
