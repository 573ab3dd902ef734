import { StyleSheet } from 'react-native';
import { radius, target } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Icon } from './Icon';
import type { IconName } from './iconMarks';
import { type Action, Press } from './Press';

type Props = Action & {
  icon: IconName;
  /** What it does, for those who cannot see the icon: "Undo Holding seen". */
  label: string;
  expanded?: boolean;
  popup?: 'dialog' | 'menu' | 'listbox';
};

/** A 48 px target round a 24 px icon; only where the icon is known to all: back, close, more, search, undo. */
export function IconButton({ icon, label, expanded, popup, href, onPress }: Props) {
  const theme = useTheme();
  return (
    <Press
      href={href}
      onPress={onPress}
      aria-label={label}
      aria-expanded={expanded}
      aria-haspopup={popup}
      style={({ pressed, hovered }) => [styles.hit, pressed || hovered ? { backgroundColor: theme.well } : null]}
    >
      <Icon name={icon} />
    </Press>
  );
}

const styles = StyleSheet.create({
  hit: {
    width: target.least,
    height: target.least,
    alignItems: 'center',
    justifyContent: 'center',
    flexShrink: 0,
    borderRadius: radius.control,
  },
});
