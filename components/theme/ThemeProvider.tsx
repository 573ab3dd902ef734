import { createContext, type ReactNode, use, useEffect, useState } from 'react';
import { Dimensions } from 'react-native';
import { usePrinting } from '@/hooks/usePrinting';
import { BreakpointProvider, breakpointOf } from './breakpoint';
import { dark } from './dark';
import { light, paper } from './light';
import { paintPage, rememberedTheme, rememberTheme } from './rememberedTheme';
import type { Theme, ThemeName } from './theme';

type Choice = { name: ThemeName; choose: (name: ThemeName) => void };

const ThemeContext = createContext<Theme>(dark);
const ChoiceContext = createContext<Choice>({ name: 'dark', choose: () => {} });

const byName: Record<ThemeName, Theme> = { dark, light };

/** Dark in a dim fishroom on a phone, light on a wide screen, unless this device chose otherwise. */
const firstTheme = (): ThemeName =>
  rememberedTheme() ?? (breakpointOf(Dimensions.get('window').width) === 'phone' ? 'dark' : 'light');

/** Colours and breakpoint for all below. */
export function ThemeProvider({ children }: { children: ReactNode }) {
  const [name, setName] = useState(firstTheme);
  const printing = usePrinting();
  const theme = printing ? paper : byName[name];
  const { ground } = byName[name];
  useEffect(() => paintPage(name, ground), [name, ground]);
  const choose = (next: ThemeName) => {
    rememberTheme(next);
    setName(next);
  };
  return (
    <ChoiceContext value={{ name, choose }}>
      <ThemeContext value={theme}>
        <BreakpointProvider>{children}</BreakpointProvider>
      </ThemeContext>
    </ChoiceContext>
  );
}

export const useTheme = (): Theme => use(ThemeContext);

/** The device's theme and how to change it. */
export const useThemeChoice = (): Choice => use(ChoiceContext);

/** What will be printed: light tokens on white in both themes. */
export function PaperTheme({ children }: { children: ReactNode }) {
  return <ThemeContext value={paper}>{children}</ThemeContext>;
}
