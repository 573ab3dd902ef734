import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { line, radius, target } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Code } from '@/components/ui/Code';
import { moveFocus } from '@/components/ui/moveFocus';
import { Press } from '@/components/ui/Press';
import { type Sex, SexShape } from '@/components/ui/SexShape';
import { Text, type Tone } from '@/components/ui/Text';
import { FieldFrame } from './FieldFrame';
import { describedBy, useFieldState } from './useFieldState';

export type Pick = {
  value: string;
  /** A fish's short code, "04"; or words, "Can't tell which". */
  code?: string;
  word?: string;
  sex?: Sex;
  /** Under it: "day 22". */
  note?: string;
  /** Already holding: dimmed, its note says why. */
  off?: boolean;
};

type GridProps = {
  label: string;
  picks: readonly Pick[];
  value: string | null;
  onPick: (value: string) => void;
  invalid?: boolean;
  describedBy?: string;
  columns?: number;
};

/** The fish of one colony as 56 px cells; words take the room of two. */
export function PickGrid({ label, picks, value, onPick, invalid, describedBy: described, columns = 4 }: GridProps) {
  const theme = useTheme();
  const first = picks.find((pick) => !pick.off);
  const reachable = picks.find((pick) => pick.value === value && !pick.off) ?? first;
  return (
    <View
      role="radiogroup"
      aria-label={label}
      aria-invalid={invalid}
      aria-describedby={described}
      onKeyDown={(event) => moveFocus(event, '[role=radio]', { press: true, columns })}
      style={[styles.grid, { backgroundColor: theme.control, borderColor: invalid ? theme.trouble : theme.control }]}
    >
      {picks.map((pick) => {
        const on = pick.value === value && !pick.off;
        return (
          <Press
            key={pick.value}
            role="radio"
            aria-checked={on}
            aria-label={[pick.code ?? pick.word, pick.sex, pick.note].filter(Boolean).join(', ')}
            unavailable={pick.off}
            tabIndex={pick === reachable ? 0 : -1}
            onPress={() => onPick(pick.value)}
            style={({ pressed }) => [
              styles.cell,
              { flexBasis: `${(pick.word ? 200 : 100) / columns - 1.5}%` },
              { backgroundColor: on ? theme.actFill : pick.off || pressed ? theme.well : theme.ground },
            ]}
          >
            <PickFace pick={pick} tone={on ? 'inverse' : pick.off ? 'faint' : 'ink'} />
          </Press>
        );
      })}
    </View>
  );
}

function PickFace({ pick, tone }: { pick: Pick; tone: Tone }): ReactNode {
  return (
    <>
      <View style={styles.code}>
        {pick.sex ? <SexShape sex={pick.sex} size={16} tone={tone} /> : null}
        {pick.code ? (
          <Code size="large" tone={tone}>
            {pick.code}
          </Code>
        ) : (
          <Text size="small" semi tone={tone} align="center">
            {pick.word}
          </Text>
        )}
      </View>
      {pick.note ? (
        <Text size="label" tone={tone === 'ink' ? 'soft' : tone}>
          {pick.note}
        </Text>
      ) : null}
    </>
  );
}

type FieldProps = Omit<GridProps, 'value' | 'onPick' | 'invalid' | 'describedBy'> & {
  name: string;
  hint?: string;
  onPicked?: (value: string) => void;
};

/** Which fish, as a field. Its label stands above as the section's head. */
export function PickField({ name, label, hint, onPicked, ...grid }: FieldProps) {
  const field = useFieldState(name);
  return (
    <FieldFrame label={label} hint={hint} field={field} quiet>
      <PickGrid
        {...grid}
        label={label}
        value={typeof field.value === 'string' ? field.value : null}
        onPick={(value) => {
          field.change(value);
          onPicked?.(value);
        }}
        invalid={field.error !== null}
        describedBy={describedBy(field, hint)}
      />
    </FieldFrame>
  );
}

const styles = StyleSheet.create({
  // The lines between cells are the ground showing through 1 px gaps.
  grid: { flexDirection: 'row', flexWrap: 'wrap', gap: 1, borderWidth: line.control, borderRadius: radius.control },
  cell: {
    flexGrow: 1,
    minHeight: target.primary,
    minWidth: 64,
    alignItems: 'center',
    justifyContent: 'center',
    padding: 4,
  },
  code: { flexDirection: 'row', alignItems: 'center', gap: 7 },
});
