import { createContext, type ReactNode, use } from 'react';
import { View } from 'react-native';
import { line } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { useGutter } from './gutter';

/** What a row has to know of the list around it. */
type RowsLook = { listed: boolean; inset: number };
const RowsContext = createContext<RowsLook>({ listed: false, inset: 0 });
export const useRowsLook = (): RowsLook => use(RowsContext);

/** Around a row whose list item is the place that a windowed list gives it. */
export function Unlisted({ children }: { children: ReactNode }) {
  const look = useRowsLook();
  return <RowsContext value={{ ...look, listed: false }}>{children}</RowsContext>;
}

type Props = {
  children: ReactNode;
  label?: string;
  /** Rows run to the edges and carry the gutter inside, so that a chosen one is coloured from edge to edge. */
  bleed?: boolean;
  /** No rule above the first: under tabs or a table head. */
  open?: boolean;
};

/** A ruled list. */
export function Rows({ children, label, bleed = false, open = false }: Props) {
  const theme = useTheme();
  const gutter = useGutter();
  return (
    <RowsContext value={{ listed: true, inset: bleed ? gutter : 0 }}>
      <View
        role="list"
        aria-label={label}
        style={[
          { borderTopWidth: open ? 0 : line.row, borderTopColor: theme.rule },
          bleed ? { marginHorizontal: -gutter } : null,
        ]}
      >
        {children}
      </View>
    </RowsContext>
  );
}
