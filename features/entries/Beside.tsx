import { Children, type ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';

/** Short fields side by side, each as wide as the others. */
export function Beside({ children }: { children: ReactNode }) {
  return (
    <View style={styles.line}>
      {Children.map(children, (child) => (
        <View style={styles.field}>{child}</View>
      ))}
    </View>
  );
}

const styles = StyleSheet.create({
  line: { flexDirection: 'row', gap: space[3] },
  field: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0 },
});
