import type { AuditLine } from '@/shared/audit/contract';

/** "Fishroom changed"; then what of it, "time zone from UTC to Europe/Oslo". */
export function changeWords({ action, about, change }: AuditLine): { title: string; details: string[] } {
  const subject = spaced(about);
  const saysItself = action.includes(' ');
  const title = saysItself ? `${capital(action)}, ${subject}` : `${capital(subject)} ${action}`;
  return { title, details: Object.entries(change).map(([field, [before, after]]) => fieldWords(field, before, after)) };
}

function fieldWords(field: string, before: unknown, after: unknown): string {
  const name = spaced(field);
  const [was, is] = [valueWords(before), valueWords(after)];
  if (was && is) return `${name} from ${was} to ${is}`;
  if (is) return `${name} ${is}`;
  return was ? `${name} was ${was}` : name;
}

/** Only what reads as a word or number; anything longer is named without its value. */
const valueWords = (value: unknown): string =>
  typeof value === 'string' || typeof value === 'number' || typeof value === 'boolean' ? String(value) : '';

/** "timeZone" is "time zone". */
const spaced = (word: string): string => word.replace(/([a-z])([A-Z])/g, (_all, a, b) => `${a} ${b.toLowerCase()}`);
const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
