import { useState } from 'react';
import type { LayoutChangeEvent } from 'react-native';

/** The width that the page gave to a drawing, in whole px; 0 before it is known. */
export function useWidth(): [width: number, onLayout: (event: LayoutChangeEvent) => void] {
  const [width, setWidth] = useState(0);
  return [width, (event) => setWidth(Math.floor(event.nativeEvent.layout.width))];
}
