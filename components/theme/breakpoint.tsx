import { createContext, type ReactNode, use } from 'react';
import { useWindowDimensions } from 'react-native';

/** `phone` has the bottom bar, `narrow` (720 up) a rail of icons with labels, `full` (1080 up) rail, list and detail. */
export type Breakpoint = 'phone' | 'narrow' | 'full';

export const breakpointOf = (width: number): Breakpoint => (width < 720 ? 'phone' : width < 1080 ? 'narrow' : 'full');

const BreakpointContext = createContext<Breakpoint>('phone');

/** Measures the window once, so that a screen is drawn again only when it crosses a breakpoint. */
export function BreakpointProvider({ children }: { children: ReactNode }) {
  const { width } = useWindowDimensions();
  return <BreakpointContext value={breakpointOf(width)}>{children}</BreakpointContext>;
}

export const useBreakpoint = (): Breakpoint => use(BreakpointContext);

/** Whether there is a rail instead of a bottom bar. */
export const useIsWide = (): boolean => use(BreakpointContext) !== 'phone';
