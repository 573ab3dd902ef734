import { InputBox } from '@/components/form/InputBox';
import { useIsWide } from '@/components/theme/breakpoint';
import { Icon } from './Icon';
import { IconButton } from './IconButton';
import { Kbd } from './Kbd';

type Props = {
  value: string;
  onChange: (value: string) => void;
  /** What can be found: "Fish, brood, tank, order". */
  placeholder: string;
  autoFocus?: boolean;
  onSubmit?: () => void;
  /** The arrow key that leads from the field into its results. */
  onDown?: () => void;
};

/** Search within a list or the whole fishroom; the key / goes to it. */
export function SearchField({ value, onChange, placeholder, autoFocus, onSubmit, onDown }: Props) {
  const wide = useIsWide();
  return (
    <InputBox
      value={value}
      onChangeText={onChange}
      onSubmitEditing={onSubmit}
      onKeyPress={(event) => {
        if (event.nativeEvent.key !== 'ArrowDown' || !onDown) return;
        event.preventDefault();
        onDown();
      }}
      inputMode="search"
      enterKeyHint="search"
      autoComplete="off"
      autoCapitalize="none"
      autoCorrect={false}
      autoFocus={autoFocus}
      placeholder={placeholder}
      aria-label={`Search: ${placeholder}`}
      lead={<Icon name="search" tone="soft" />}
      end={
        value !== '' ? (
          <IconButton icon="close" label="Clear the search" onPress={() => onChange('')} />
        ) : wide ? (
          <KeyHint />
        ) : undefined
      }
    />
  );
}

const KeyHint = () => <Kbd letter="/" spaced />;
