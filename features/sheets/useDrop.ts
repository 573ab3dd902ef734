import { type RefObject, useEffect, useRef } from 'react';
import type { View } from 'react-native';
import { elementOf } from '@/components/ui/elementOf';

/** Files dropped on a part of the page are handed on; returns what opens the browser's own chooser. */
export function useDrop(zone: RefObject<View | null>, take: (file: File) => void): () => void {
  const latest = useRef(take);
  latest.current = take;
  useEffect(() => {
    const element = elementOf(zone.current);
    if (!element) return;
    const over = (event: Event) => event.preventDefault();
    const drop = (event: Event) => {
      event.preventDefault();
      const file = event instanceof DragEvent ? event.dataTransfer?.files[0] : undefined;
      if (file) latest.current(file);
    };
    element.addEventListener('dragover', over);
    element.addEventListener('drop', drop);
    return () => {
      element.removeEventListener('dragover', over);
      element.removeEventListener('drop', drop);
    };
  }, [zone]);
  return () => {
    const chooser = document.createElement('input');
    chooser.type = 'file';
    chooser.accept = '.json,application/json';
    chooser.onchange = () => {
      const file = chooser.files?.[0];
      if (file) latest.current(file);
    };
    chooser.click();
  };
}
