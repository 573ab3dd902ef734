import type { View } from 'react-native';

/** Puts the focus on the first field, in reading order, that has an error; inside a group, on the member in tab order. */
export function focusFirstError(box: View | null): void {
  const form: unknown = box;
  if (typeof HTMLElement === 'undefined' || !(form instanceof HTMLElement)) return;
  const wrong = form.querySelector<HTMLElement>('[aria-invalid=true]');
  if (!wrong) return;
  const inner = wrong.matches('input, textarea, [tabindex="0"]')
    ? wrong
    : wrong.querySelector<HTMLElement>('[tabindex="0"], input');
  (inner ?? wrong).focus();
}
