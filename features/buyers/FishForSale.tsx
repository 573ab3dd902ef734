import { useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Button } from '@/components/ui/Button';
import { Heading } from '@/components/ui/Heading';
import { PhotoTile } from '@/components/ui/PhotoTile';
import { StageGlyph } from '@/components/ui/StageGlyph';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import type { AvailableFish, AvailablePage } from '@/shared/buyers/available';
import { classesLine, comingWords, eachWords, factsLine, lotsLine } from '@/shared/buyers/publicWords';
import { LineagePreview } from './LineagePreview';
import { publicPhoto } from './publicQueries';

/** A brood on the public page: what it is, how many, how long, what it costs, whose it is. */
export function FishForSale({ fish, page }: { fish: AvailableFish; page: AvailablePage }) {
  const theme = useTheme();
  const [shown, setShown] = useState(false);
  const said = fish.coming ? [comingWords(fish)] : [classesLine(fish, page.currency), lotsLine(fish, page.currency)];
  return (
    <View role="listitem" style={[styles.fish, { borderBottomColor: theme.rule }]}>
      <View style={styles.pair}>
        <Heading level={3} size="large" italic style={styles.name}>
          {fish.name}
        </Heading>
        <Text size="large" strong whole>
          {eachWords(fish, page.currency)}
        </Text>
      </View>
      <View style={styles.pair}>
        <Text style={styles.name}>{factsLine(fish)}</Text>
        {fish.coming ? null : (
          <Text whole>
            <Text strong>{fish.available}</Text>
            <Text tone="soft"> available</Text>
          </Text>
        )}
      </View>
      {[...said, fish.note].map((words) =>
        words ? (
          <Text key={words} size="small" tone="soft" style={styles.more}>
            {words}
          </Text>
        ) : null,
      )}
      <View style={styles.foot}>
        {fish.photoId ? (
          <View style={styles.photo}>
            <PhotoTile
              uri={publicPhoto(page.slug, fish.photoId, 'small')}
              alt={`Photo of ${fish.name}, brood ${fish.code}`}
              aspect={1.5}
            />
          </View>
        ) : null}
        <StageGlyph stage={fish.stage} width={34} word size="small" />
        <View style={styles.acts}>
          <TextLink label={shown ? 'Hide lineage' : 'Lineage'} onPress={() => setShown(!shown)} />
          {fish.coming && fish.strainId ? (
            <Button
              small
              label="Tell me"
              describe={`Tell me when ${fish.name} are large enough`}
              href={`/available/${page.slug}/ask?strain=${fish.strainId}`}
            />
          ) : (
            <Button
              small
              label="Ask"
              describe={`Ask for ${fish.name}, brood ${fish.code}`}
              href={`/available/${page.slug}/ask?brood=${fish.broodId}`}
            />
          )}
        </View>
      </View>
      {shown ? <LineagePreview fish={fish} /> : null}
    </View>
  );
}

const styles = StyleSheet.create({
  fish: { paddingVertical: space[3], borderBottomWidth: line.row },
  pair: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    justifyContent: 'space-between',
    alignItems: 'baseline',
    columnGap: space[3],
  },
  name: { flexShrink: 1 },
  more: { marginTop: space[1] },
  foot: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'center',
    justifyContent: 'space-between',
    columnGap: space[3],
    marginTop: space[2],
  },
  photo: { width: 72 },
  acts: { flexDirection: 'row', alignItems: 'center', gap: space[4], marginLeft: 'auto' },
});
