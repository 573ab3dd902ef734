import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';

/** Small buttons one after the other, in as many lines as they need. */
export function ButtonWrap({ children }: { children: ReactNode }) {
  return <View style={styles.wrap}>{children}</View>;
}

const styles = StyleSheet.create({
  wrap: { flexDirection: 'row', flexWrap: 'wrap', gap: space[2], marginBottom: space[3] },
});
