import { StyleSheet, View } from 'react-native';
import { line, radius } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Icon } from '@/components/ui/Icon';

/** The drawn box alone; the row round it is what is pressed. */
export function CheckBox({ on, off = false }: { on: boolean; off?: boolean }) {
  const theme = useTheme();
  const fill = on && !off;
  return (
    <View
      style={[
        styles.box,
        {
          borderColor: fill ? theme.actFill : theme.control,
          backgroundColor: fill ? theme.actFill : 'transparent',
          borderStyle: off ? 'dashed' : 'solid',
        },
      ]}
    >
      {on ? <Icon name="tick" size={20} width={2.4} tone={off ? 'faint' : 'inverse'} /> : null}
    </View>
  );
}

const styles = StyleSheet.create({
  box: {
    width: 26,
    height: 26,
    alignItems: 'center',
    justifyContent: 'center',
    borderWidth: line.control,
    borderRadius: radius.control,
    flexShrink: 0,
  },
});
