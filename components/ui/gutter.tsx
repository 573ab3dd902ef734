import { createContext, type ReactNode, use } from 'react';
import { View } from 'react-native';

const GutterContext = createContext(16);

/** The side margin that the screen or pane around has set. */
export const useGutter = (): number => use(GutterContext);

export function GutterProvider({ value, children }: { value: number; children: ReactNode }) {
  return <GutterContext value={value}>{children}</GutterContext>;
}

/** Runs to the edges of the screen or pane: photos, lists beside a detail. */
export function Bleed({ children }: { children: ReactNode }) {
  const gutter = useGutter();
  return <View style={{ marginHorizontal: -gutter }}>{children}</View>;
}
