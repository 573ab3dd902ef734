import type { Href } from 'expo-router';
import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { useIsWide } from '@/components/theme/breakpoint';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Code } from './Code';
import { useGutter } from './gutter';
import { Heading } from './Heading';
import { IconButton } from './IconButton';
import { usePane } from './paneContext';
import { type Sex, SexShape } from './SexShape';
import { Text } from './Text';

export type ScreenHeadProps = {
  /** The h1, and the tab's title. */
  title: string;
  /** The title is a code and set as one. */
  code?: boolean;
  sex?: Sex;
  /** Under the title on a phone, beside it on a wide screen. */
  subtitle?: ReactNode;
  /** Where "back" leads. */
  back?: Href;
  /** A form or dialog-like page closes instead. The label says what becomes of what was typed. */
  close?: { label: string; onPress: () => void };
  /** Icon buttons on a phone; on a wide screen buttons with words have the room. */
  actions?: ReactNode;
};

/** The head of a screen: a place's own name is large, a page below it has a bar with the way back. */
export function ScreenHead(props: ScreenHeadProps) {
  const wide = useIsWide();
  const alone = usePane() === 'alone';
  const isPlace = !props.back && !props.close;
  return (
    <View role={alone ? 'banner' : undefined} dataSet={{ printHide: true }}>
      {wide ? <WideHead {...props} /> : isPlace ? <PlaceHead {...props} /> : <PageHead {...props} />}
    </View>
  );
}

function PlaceHead(props: ScreenHeadProps) {
  return (
    <View style={styles.place}>
      <View style={styles.mid}>
        <Title {...props} size="page" />
        <Subtitle subtitle={props.subtitle} />
      </View>
      <View style={styles.placeActions}>{props.actions}</View>
    </View>
  );
}

function PageHead(props: ScreenHeadProps) {
  const { back, close } = props;
  return (
    <View style={styles.page}>
      {close ? <IconButton icon="close" label={close.label} onPress={close.onPress} /> : null}
      {back ? <IconButton icon="back" label="Back" href={back} /> : null}
      <View style={styles.mid}>
        <Title {...props} size="title" />
        <Subtitle subtitle={props.subtitle} />
      </View>
      <View style={styles.actions}>{props.actions}</View>
    </View>
  );
}

function WideHead(props: ScreenHeadProps) {
  const theme = useTheme();
  const pane = usePane();
  const gutter = useGutter();
  const alone = pane === 'alone';
  // A list runs to the pane's edges and so does its rule; elsewhere the first section brings its own.
  const rule = pane === 'list' ? { borderBottomWidth: line.section, borderBottomColor: theme.ruleStrong } : null;
  return (
    <View style={[styles.wide, { paddingHorizontal: gutter }, rule]}>
      {alone && props.back ? <IconButton icon="back" label="Back" href={props.back} /> : null}
      {props.close ? <IconButton icon="close" label={props.close.label} onPress={props.close.onPress} /> : null}
      <View style={styles.wideWords}>
        <Title {...props} size={alone && !props.back && !props.close ? 'page' : 'heading'} />
        <Subtitle subtitle={props.subtitle} />
      </View>
      <View style={styles.wideActions}>{props.actions}</View>
    </View>
  );
}

function Title({ title, code, sex, size }: ScreenHeadProps & { size: 'page' | 'title' | 'heading' }) {
  return (
    <View style={styles.title}>
      {sex ? <SexShape sex={sex} size={18} /> : null}
      <Heading level={1} size={size} tabIndex={-1} style={styles.shrink}>
        {code ? <Code>{title}</Code> : title}
      </Heading>
    </View>
  );
}

function Subtitle({ subtitle }: { subtitle: ReactNode }) {
  if (typeof subtitle !== 'string') return subtitle;
  return (
    <Text size="small" tone="soft">
      {subtitle}
    </Text>
  );
}

const styles = StyleSheet.create({
  place: {
    flexDirection: 'row',
    alignItems: 'flex-end',
    justifyContent: 'space-between',
    minHeight: 54,
    paddingHorizontal: space[4],
    paddingBottom: space[2],
  },
  placeActions: { flexDirection: 'row', gap: space[1], marginRight: -12, marginBottom: -4 },
  page: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: space[1],
    minHeight: 56,
    paddingHorizontal: space[1],
    paddingVertical: space[1],
  },
  mid: { flexGrow: 1, flexShrink: 1, minWidth: 0 },
  title: { flexDirection: 'row', alignItems: 'center', gap: space[2], flexShrink: 1 },
  shrink: { flexShrink: 1 },
  actions: { flexDirection: 'row', flexShrink: 0 },
  wide: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'center',
    gap: space[3],
    minHeight: 78,
    paddingVertical: space[3],
  },
  wideWords: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'baseline',
    columnGap: 14,
    flexGrow: 1,
    flexShrink: 1,
  },
  wideActions: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space[2] },
});
