import { StyleSheet } from 'react-native';
import { line, radius, target } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Icon } from '@/components/ui/Icon';
import { Press } from '@/components/ui/Press';

type Props = { icon: 'minus' | 'plus'; label: string; onPress: () => void; unavailable?: boolean; frameless?: boolean };

/** One step less or more. */
export function StepKey({ icon, label, onPress, unavailable, frameless = false }: Props) {
  const theme = useTheme();
  return (
    <Press
      onPress={onPress}
      unavailable={unavailable}
      aria-label={label}
      style={({ pressed, hovered }) => [
        styles.key,
        frameless ? null : [styles.frame, { borderColor: theme.control }],
        pressed || hovered ? { backgroundColor: theme.well } : null,
      ]}
    >
      <Icon name={icon} tone={unavailable ? 'faint' : 'ink'} />
    </Press>
  );
}

const styles = StyleSheet.create({
  key: { width: 60, minHeight: target.least, alignItems: 'center', justifyContent: 'center' },
  frame: { borderWidth: line.control, borderRadius: radius.control },
});
