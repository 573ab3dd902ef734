import { type ReactNode, type RefObject, useEffect, useRef } from 'react';
import { Modal, Pressable, ScrollView, StyleSheet, useWindowDimensions, View } from 'react-native';
import { useSafeAreaInsets } from 'react-native-safe-area-context';
import { useIsWide } from '@/components/theme/breakpoint';
import { line, radius, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { elementOf } from './elementOf';
import { GutterProvider } from './gutter';
import { Heading } from './Heading';
import { IconButton } from './IconButton';
import { placeBeside } from './placeBeside';

type Props = {
  open: boolean;
  onClose: () => void;
  title: string;
  children: ReactNode;
  /** On a wide screen it stands beside this; without it, in the middle. */
  anchor?: RefObject<View | null>;
  width?: number;
  /** Fixed at the foot: the primary action. */
  dock?: ReactNode;
};

/** Covers the page from below on a phone, stands beside its button on a wide screen. Esc and the scrim close it. */
export function Sheet({ open, onClose, title, ...rest }: Props) {
  return (
    <Modal visible={open} transparent onRequestClose={onClose} aria-label={title}>
      {open ? <SheetBody title={title} onClose={onClose} {...rest} /> : null}
    </Modal>
  );
}

function SheetBody({ title, onClose, children, anchor, width = 420, dock }: Omit<Props, 'open'>) {
  const theme = useTheme();
  const wide = useIsWide();
  const insets = useSafeAreaInsets();
  const window = useWindowDimensions();
  const body = useRef<View>(null);
  useEffect(() => {
    // After the trap has noted what had the focus before, so that it can be given back.
    const soon = setTimeout(() => {
      const sheet = elementOf(body.current);
      // On a phone the search would bring up the keyboard over the list that it searches.
      const search = wide ? sheet?.querySelector<HTMLElement>('input[type=search]') : null;
      (search ?? sheet)?.focus({ preventScroll: true });
    }, 0);
    return () => clearTimeout(soon);
  }, [wide]);
  const beside = wide ? placeBeside(elementOf(anchor?.current ?? null), window, width) : null;
  const frame = wide
    ? [styles.popover, { width, borderColor: theme.control }, beside]
    : [styles.bottom, { paddingBottom: Math.max(space[6], insets.bottom) }];
  return (
    <View style={[styles.cover, wide && !beside ? styles.middle : null]}>
      <Pressable
        aria-hidden
        tabIndex={-1}
        onPress={onClose}
        dataSet={{ fade: true }}
        style={[StyleSheet.absoluteFill, { backgroundColor: beside ? 'transparent' : theme.scrim }]}
      />
      <View
        ref={body}
        tabIndex={-1}
        dataSet={{ rise: true, quietFocus: true }}
        style={[
          styles.sheet,
          { backgroundColor: theme.sheet, boxShadow: theme.sheetShadow, maxHeight: window.height * 0.92 },
          frame,
        ]}
      >
        <View style={styles.head}>
          <Heading level={2} size={wide ? 'title' : 'heading'} style={styles.title}>
            {title}
          </Heading>
          <IconButton icon="close" label="Close" onPress={onClose} />
        </View>
        <GutterProvider value={16}>
          <ScrollView style={styles.scroll} contentContainerStyle={styles.inner}>
            {children}
          </ScrollView>
          {dock ? <View style={styles.dock}>{dock}</View> : null}
        </GutterProvider>
      </View>
    </View>
  );
}

const styles = StyleSheet.create({
  cover: { flexGrow: 1, justifyContent: 'flex-end' },
  middle: { justifyContent: 'center', alignItems: 'center' },
  sheet: { overflow: 'hidden' },
  bottom: { width: '100%', borderTopWidth: line.row },
  popover: { borderWidth: line.row, borderRadius: radius.control, paddingBottom: space[2] },
  head: {
    flexDirection: 'row',
    alignItems: 'center',
    justifyContent: 'space-between',
    paddingTop: space[2],
    paddingLeft: space[4],
    paddingRight: space[1],
  },
  title: { flexShrink: 1 },
  scroll: { flexGrow: 0, flexShrink: 1 },
  inner: { paddingHorizontal: space[4], paddingBottom: space[2] },
  dock: { paddingHorizontal: space[4], paddingTop: 14 },
});
