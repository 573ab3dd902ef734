import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { Icon } from '@/components/ui/Icon';
import { Text } from '@/components/ui/Text';
import type { FieldState } from './useFieldState';

type Props = {
  label: string;
  /** Right of the label: "not needed", "2 already holding". */
  aside?: string;
  /** Under the field: where a value came from, how to write it. */
  hint?: string;
  field: FieldState;
  /** The label is already on the screen, as a section's head. */
  quiet?: boolean;
  children: ReactNode;
};

/** Label above, control, then hint and error under it. */
export function FieldFrame({ label, aside, hint, field, quiet = false, children }: Props) {
  return (
    <View>
      {quiet ? null : (
        <View style={styles.top}>
          <Text id={field.labelId} size="small" semi>
            {label}
          </Text>
          {aside ? (
            <Text size="small" tone="soft">
              {aside}
            </Text>
          ) : null}
        </View>
      )}
      {children}
      {hint ? (
        <Text id={field.hintId} size="small" tone="soft" style={styles.under}>
          {hint}
        </Text>
      ) : null}
      <FieldError id={field.errorId} words={field.error} />
    </View>
  );
}

/** What to change, with the hollow triangle. */
export function FieldError({ id, words }: { id: string; words: string | null }) {
  if (words === null) return null;
  return (
    <View style={styles.error}>
      <Icon name="warn" size={20} tone="trouble" />
      <Text id={id} size="small" semi tone="trouble" aria-live="polite" style={styles.words}>
        {words}
      </Text>
    </View>
  );
}

const styles = StyleSheet.create({
  top: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    justifyContent: 'space-between',
    columnGap: space[3],
    marginBottom: 6,
  },
  under: { marginTop: 6 },
  error: { flexDirection: 'row', gap: space[2], marginTop: 6 },
  words: { flexShrink: 1 },
});
