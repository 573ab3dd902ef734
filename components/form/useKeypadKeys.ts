import { useEffect, useEffectEvent } from 'react';
import { Vibration } from 'react-native';
import { withKey } from './withKey';

type Keypad = {
  value: string;
  onChange: (value: string) => void;
  onNext: () => void;
  digits?: number;
  extra?: '.5' | '.';
};

/** What the keys do to the number, for the drawn keys and the keyboard's alike. */
export function useKeypadKeys({ value, onChange, onNext, digits = 4, extra = '.5' }: Keypad) {
  const press = (key: string) => {
    const next = withKey(value, key, digits, extra);
    if (next === value) return;
    // A short pulse says that the key was taken; wet fingers feel more than they see.
    Vibration.vibrate(12);
    onChange(next);
  };
  const erase = () => onChange(value.endsWith('.5') && extra === '.5' ? value.slice(0, -2) : value.slice(0, -1));
  const typed = useEffectEvent((event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    if (event.target instanceof HTMLInputElement || event.target instanceof HTMLTextAreaElement) return;
    const onKey = event.target instanceof HTMLElement && event.target.closest('button, a') !== null;
    if (/^\d$/.test(event.key)) press(event.key);
    else if (event.key === ',' || event.key === '.') press('.');
    else if (event.key === 'Backspace') erase();
    else if (event.key === 'Enter' && !onKey) onNext();
    else return;
    event.preventDefault();
  });
  useEffect(() => {
    if (typeof document === 'undefined') return;
    document.addEventListener('keydown', typed);
    return () => document.removeEventListener('keydown', typed);
  }, []);
  return { press, erase };
}
