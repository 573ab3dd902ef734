import { type Href, Link } from 'expo-router';
import { type ReactNode, type Ref, useState } from 'react';
import {
  Pressable,
  type PressableProps,
  type StyleProp,
  StyleSheet,
  type View,
  type ViewStyle,
  type WebKeyEvent,
} from 'react-native';

/** Goes somewhere or does something, never both. */
export type Action = { href: Href; onPress?: undefined } | { onPress: () => void; href?: undefined };
/** May also do neither: a row that only tells. */
export type MaybeAction = Action | { href?: undefined; onPress?: undefined };

export type PressState = { pressed: boolean; hovered: boolean };

type Props = Omit<PressableProps, 'style' | 'children' | 'onPress' | 'disabled' | 'href'> & {
  href?: Href;
  onPress?: () => void;
  /** Says no without leaving the tab order, so that the reason can be read. */
  unavailable?: boolean;
  style?: StyleProp<ViewStyle> | ((state: PressState) => StyleProp<ViewStyle>);
  children?: ReactNode | ((state: PressState) => ReactNode);
  ref?: Ref<View>;
};

/** Everything that can be pressed: a link when it has an address, else a button unless `role` says more. */
export function Press({ href, onPress, unavailable = false, style, children, role, onKeyDown, ref, ...rest }: Props) {
  const [pressed, setPressed] = useState(false);
  const [hovered, setHovered] = useState(false);
  const act = unavailable ? undefined : onPress;
  const byKey = (event: WebKeyEvent) => {
    onKeyDown?.(event);
    // Radios, tabs and check boxes answer to the space bar too; buttons already do.
    if (event.key === ' ' && role && role !== 'button' && act) {
      event.preventDefault();
      act();
    }
  };
  const state: PressState = { pressed: pressed && !unavailable, hovered: hovered && !unavailable };
  const body = (
    <Pressable
      {...rest}
      ref={ref}
      // A link stays a link, except in a menu, whose members are all menu items.
      role={href && role !== 'menuitem' ? undefined : (role ?? 'button')}
      aria-disabled={unavailable || undefined}
      onPress={act}
      onPressIn={() => setPressed(true)}
      onPressOut={() => setPressed(false)}
      onHoverIn={() => setHovered(true)}
      onHoverOut={() => setHovered(false)}
      onKeyDown={byKey}
      // A link hands its style on as one object.
      style={StyleSheet.flatten(typeof style === 'function' ? style(state) : style)}
    >
      {typeof children === 'function' ? children(state) : children}
    </Pressable>
  );
  if (!href || unavailable) return body;
  return (
    <Link href={href} asChild>
      {body}
    </Link>
  );
}
