import { useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { line, space, target } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Code } from '@/components/ui/Code';
import { Icon } from '@/components/ui/Icon';
import { moveFocus } from '@/components/ui/moveFocus';
import { Press } from '@/components/ui/Press';
import { SearchField } from '@/components/ui/SearchField';
import { Text } from '@/components/ui/Text';
import { found } from './found';
import type { Option } from './Select';

const MOST_SHOWN = 80;
const SEARCHED_OVER = 8;

type Props = {
  id: string;
  label: string;
  options: readonly Option[];
  value: string | null;
  onPick: (value: string) => void;
  onNew?: (text: string) => void;
  newWord?: (text: string) => string;
};

/** The options, with a search over them where they are many. Arrow keys walk from the search into the list. */
export function SelectList({ id, label, options, value, onPick, onNew, newWord }: Props) {
  const theme = useTheme();
  const [search, setSearch] = useState('');
  const matches = found(options, search);
  const shown = matches.slice(0, MOST_SHOWN);
  const typed = search.trim();
  return (
    <View onKeyDown={(event) => moveFocus(event, 'input[type=search], [role=radio]', { upDown: true })}>
      {options.length > SEARCHED_OVER || onNew ? (
        <View style={styles.search}>
          <SearchField
            value={search}
            onChange={setSearch}
            placeholder={label}
            onDown={() => firstOf(id)}
            onSubmit={() => shown[0] && onPick(shown[0].value)}
          />
        </View>
      ) : null}
      <View id={id} role="radiogroup" aria-label={label}>
        {shown.map((option) => (
          <OptionLine
            key={option.value}
            option={option}
            on={option.value === value}
            onPick={() => onPick(option.value)}
          />
        ))}
      </View>
      {matches.length > MOST_SHOWN ? (
        <Text size="small" tone="soft" style={styles.note}>
          {`${matches.length - MOST_SHOWN} more. Type to narrow them down.`}
        </Text>
      ) : null}
      {matches.length === 0 && !onNew ? (
        <Text size="small" tone="soft" style={styles.note}>
          {`Nothing is called "${typed}".`}
        </Text>
      ) : null}
      {onNew && typed !== '' ? (
        <Press onPress={() => onNew(typed)} style={[styles.option, { borderTopColor: theme.rule }]}>
          <Icon name="plus" />
          <Text semi style={styles.words}>
            {newWord?.(typed) ?? `Add "${typed}"`}
          </Text>
        </Press>
      ) : null}
    </View>
  );
}

/** From the search into the list. */
function firstOf(listId: string): void {
  document.getElementById(listId)?.querySelector<HTMLElement>('[role=radio]')?.focus();
}

function OptionLine({ option, on, onPick }: { option: Option; on: boolean; onPick: () => void }) {
  const theme = useTheme();
  return (
    <Press
      role="radio"
      aria-checked={on}
      onPress={onPick}
      // Enter is a press already; the space bar is added by Press.
      style={({ pressed, hovered }) => [
        styles.option,
        { borderTopColor: theme.rule },
        pressed || hovered ? { backgroundColor: theme.well } : null,
      ]}
    >
      <View style={styles.words}>
        <View style={styles.first}>
          {option.code ? <Code>{option.code}</Code> : null}
          <Text strong={on} italic={option.italic} style={styles.word}>
            {option.word}
          </Text>
        </View>
        {option.note ? (
          <Text size="small" tone="soft">
            {option.note}
          </Text>
        ) : null}
      </View>
      {on ? <Icon name="tick" size={20} width={2.4} /> : null}
    </Press>
  );
}

const styles = StyleSheet.create({
  search: { paddingVertical: space[2] },
  option: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: space[3],
    minHeight: target.least,
    paddingVertical: space[2],
    borderTopWidth: line.row,
  },
  words: { flexGrow: 1, flexShrink: 1, minWidth: 0 },
  first: { flexDirection: 'row', alignItems: 'baseline', gap: space[2] },
  word: { flexShrink: 1 },
  note: { paddingVertical: space[3] },
});
