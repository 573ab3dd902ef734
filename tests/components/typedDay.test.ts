import { expect, test } from 'vitest';
import { typedDay } from '@/components/form/typedDay';

// A Thursday.
const TODAY = '2026-05-14';

test.each([
  ['12 May', '2026-05-12'],
  ['12 may', '2026-05-12'],
  ['Tue 12 May', '2026-05-12'],
  ['12 May 2024', '2024-05-12'],
  ['12. May 24', '2024-05-12'],
  ['12.5.', '2026-05-12'],
  ['12.5', '2026-05-12'],
  ['12/5/25', '2025-05-12'],
  ['12-05-2025', '2025-05-12'],
  ['2026-05-12', '2026-05-12'],
  ['today', TODAY],
  ['yesterday', '2026-05-13'],
  ['-3', '2026-05-11'],
  ['−3', '2026-05-11'],
  ['29 Feb 2024', '2024-02-29'],
])('reads "%s" as a keeper means it', (text, day) => expect(typedDay(text, TODAY)).toBe(day));

test('a date without a year that has not come yet is last year’s', () => {
  expect(typedDay('20 Dec', TODAY)).toBe('2025-12-20');
  expect(typedDay('15.5.', TODAY)).toBe('2025-05-15');
});

test('29 February without a year is the last one that was, if last year had one', () => {
  expect(typedDay('29 Feb', '2024-05-14')).toBe('2024-02-29');
  expect(typedDay('29 Feb', TODAY)).toBeNull();
});

test.each(['', 'soon', '31 Apr', '32.1.', '12.13.', '5 Foo', '30 Feb 2025', '1.2.3.4'])(
  'does not guess a day from "%s"',
  (text) => expect(typedDay(text, TODAY)).toBeNull(),
);
