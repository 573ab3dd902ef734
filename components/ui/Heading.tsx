import type { TextSize } from '@/components/theme/type';
import { Text, type TextProps } from './Text';

const sizes: Record<1 | 2 | 3, TextSize> = { 1: 'heading', 2: 'body', 3: 'label' };

/** A heading by its level; its look may be larger than its rank. */
export function Heading({ level, size, ...rest }: TextProps & { level: 1 | 2 | 3 }) {
  return <Text {...rest} role="heading" aria-level={level} size={size ?? sizes[level]} strong={rest.semi !== true} />;
}
