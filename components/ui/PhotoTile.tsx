import { Image, StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { type MaybeAction, Press } from './Press';
import { Text } from './Text';

type Props = MaybeAction & {
  /** The thumbnail; null while it is on its way. */
  uri: string | null;
  /** What is to be seen: "DUMA-26C, 3 May 2026, 4.6 cm". */
  alt: string;
  caption?: string;
  /** Width by height. */
  aspect?: number;
  /** Taken here, not yet sent. */
  waiting?: boolean;
};

/** A photo on its mat; one treatment in both themes. */
export function PhotoTile({ uri, alt, caption, aspect = 1, waiting = false, href, onPress }: Props) {
  const theme = useTheme();
  const mat = [
    styles.mat,
    { aspectRatio: aspect, backgroundColor: theme.well, borderColor: theme.control },
    waiting ? styles.waiting : null,
  ];
  const picture = (
    <View style={mat}>
      {uri ? <Image source={{ uri }} alt={alt} resizeMode="cover" style={styles.picture} /> : null}
    </View>
  );
  return (
    <View>
      {href === undefined && onPress === undefined ? (
        picture
      ) : (
        <Press href={href} onPress={onPress} aria-label={alt}>
          {picture}
        </Press>
      )}
      {caption ? (
        <Text size="small" tone="soft" style={styles.caption}>
          {caption}
        </Text>
      ) : null}
    </View>
  );
}

const styles = StyleSheet.create({
  mat: { width: '100%', overflow: 'hidden' },
  waiting: { borderWidth: 2, borderStyle: 'dashed' },
  picture: { width: '100%', height: '100%' },
  caption: { marginTop: space[1] },
});
