import { Icon } from './Icon';
import type { IconName } from './iconMarks';
import type { Action } from './Press';
import { Row } from './Row';

type Props = Action & {
  title: string;
  note?: string;
  icon?: IconName;
  /** Right before the arrow: a value, a count. */
  value?: string;
  /** Shown in the detail beside. */
  selected?: boolean;
};

/** A row that only leads on: settings, sub-pages. */
export function LinkRow({ title, note, icon, value, selected, href, onPress }: Props) {
  const action: Action = href === undefined ? { onPress: onPress ?? (() => {}) } : { href };
  return (
    <Row
      {...action}
      label={[title, value, note].filter(Boolean).join(', ')}
      title={title}
      note={note}
      lead={icon ? <Icon name={icon} /> : undefined}
      state={value}
      end={<Icon name="next" tone="soft" />}
      selected={selected}
      middle
    />
  );
}
