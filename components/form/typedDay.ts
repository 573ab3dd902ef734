import { addDays, type Day, isDay } from '@/shared/days';

const MONTHS = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];

/**
 * A day as a keeper types it: "12 May", "12 may 2025", "12.5.", "12/5/26", "2026-05-12", "today", "yesterday", "-3".
 * Day before month, as in all of the product. Without a year it is the last such day that is not after today. Null when
 * it is no day.
 */
export function typedDay(text: string, today: Day): Day | null {
  const typed = text.trim().toLowerCase();
  if (isDay(typed)) return typed;
  if (typed === 'today') return today;
  if (typed === 'yesterday') return addDays(today, -1);
  const ago = /^[-−](\d{1,4})$/.exec(typed);
  if (ago) return addDays(today, -Number(ago[1]));
  const named = /^(?:[a-z]{2,9},?\s+)?(\d{1,2})\.?\s*([a-z]{3,9})\.?(?:\s+(\d{4}|\d{2}))?$/.exec(typed);
  if (named) return dayFrom(named[1], MONTHS.indexOf((named[2] ?? '').slice(0, 3)) + 1, named[3], today);
  const numbers = /^(\d{1,2})[./-](\d{1,2})(?:[./-](\d{4}|\d{2})?)?$/.exec(typed);
  return numbers ? dayFrom(numbers[1], Number(numbers[2]), numbers[3], today) : null;
}

function dayFrom(date: string | undefined, month: number, year: string | undefined, today: Day): Day | null {
  const full = year === undefined ? today.slice(0, 4) : year.length === 2 ? `20${year}` : year;
  const day = `${full}-${pad(month)}-${pad(Number(date))}`;
  if (!isDay(day)) return null;
  if (year !== undefined || day <= today) return day;
  const lastYear = `${Number(full) - 1}${day.slice(4)}`;
  return isDay(lastYear) ? lastYear : null;
}

const pad = (part: number) => String(part).padStart(2, '0');
