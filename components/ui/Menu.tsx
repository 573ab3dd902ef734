import { useRef, useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { line, space, target } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Button } from './Button';
import { Icon } from './Icon';
import { IconButton } from './IconButton';
import type { IconName } from './iconMarks';
import { moveFocus } from './moveFocus';
import { type Action, Press } from './Press';
import { Sheet } from './Sheet';
import { Text } from './Text';

export type MenuItem = Action & {
  word: string;
  icon?: IconName;
  /** What it does to what, where one word is not enough. */
  note?: string;
  /** One of several, of which this holds: an order of a list. */
  on?: boolean;
};

type Props = {
  /** Of the button and of the menu: "More", "Order". */
  label: string;
  items: MenuItem[];
  /** A button with this word instead of three bars. */
  word?: string;
  icon?: IconName;
};

/** More that can be done here; a sheet on a phone, beside its button on a wide screen. */
export function Menu({ label, items, word, icon }: Props) {
  const [open, setOpen] = useState(false);
  const anchor = useRef<View>(null);
  const choosing = items.some((item) => item.on !== undefined);
  const show = () => setOpen(true);
  return (
    <View ref={anchor}>
      {word ? (
        <Button label={word} describe={`${label}: ${word}`} icon={icon} small onPress={show} />
      ) : (
        <IconButton icon={icon ?? 'more'} label={label} popup="menu" expanded={open} onPress={show} />
      )}
      <Sheet open={open} onClose={() => setOpen(false)} title={label} anchor={anchor} width={300}>
        <View
          role={choosing ? 'radiogroup' : 'menu'}
          aria-label={label}
          onKeyDown={(event) => moveFocus(event, choosing ? '[role=radio]' : '[role=menuitem], a')}
        >
          {items.map((item) => (
            <MenuLine key={item.word} item={item} close={() => setOpen(false)} />
          ))}
        </View>
      </Sheet>
    </View>
  );
}

function MenuLine({ item, close }: { item: MenuItem; close: () => void }) {
  const theme = useTheme();
  const act = () => {
    close();
    item.onPress?.();
  };
  return (
    <Press
      href={item.href}
      onPress={act}
      role={item.on === undefined ? 'menuitem' : 'radio'}
      aria-checked={item.on}
      aria-label={item.note ? `${item.word}. ${item.note}` : item.word}
      style={({ pressed, hovered }) => [
        styles.line,
        { borderTopColor: theme.rule },
        pressed || hovered ? { backgroundColor: theme.well } : null,
      ]}
    >
      {item.icon ? <Icon name={item.icon} /> : null}
      <View style={styles.words}>
        <Text semi={!item.on} strong={item.on === true}>
          {item.word}
        </Text>
        {item.note ? (
          <Text size="small" tone="soft">
            {item.note}
          </Text>
        ) : null}
      </View>
      {item.on ? <Icon name="tick" size={20} width={2.4} /> : null}
    </Press>
  );
}

const styles = StyleSheet.create({
  line: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: space[3],
    minHeight: target.primary,
    paddingVertical: space[2],
    borderTopWidth: line.row,
  },
  words: { flexGrow: 1, flexShrink: 1 },
});
