import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { Code } from '@/components/ui/Code';
import { Row } from '@/components/ui/Row';
import { StageGlyph } from '@/components/ui/StageGlyph';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import type { Offer } from '@/shared/buyers/offers';
import { formatMoney } from '@/shared/money';
import { priceOf } from '@/shared/orders/price';
import { formatLength } from '@/shared/unitWords';

/** A brood: how many are available, what they are, how long, and what one costs. */
export function OfferRow({ offer, selected }: { offer: Offer; selected: boolean }) {
  const room = useRoom();
  const { broodId, code, displayName, locality, available, reserved, kept, size, stage } = offer;
  const price = eachOf(offer);
  const taken = [...(reserved > 0 ? [`${reserved} reserved`] : []), ...(kept > 0 ? [`${kept} kept back`] : [])].join(
    ', ',
  );
  return (
    <Row
      href={`/r/${room.id}/buyers/availability/${broodId}`}
      label={`${code}, ${available} available${taken ? `, ${taken}` : ''}`}
      selected={selected}
      figure={String(available)}
      unit="fish"
      title={
        <Text strong italic>
          {displayName ?? 'Species not settled'}
        </Text>
      }
      state={price === null ? undefined : <Text strong>{formatMoney(price, room.currency)}</Text>}
      note={
        <Text size="small" tone="soft">
          <Code>{code}</Code>
          {[locality, taken].filter(Boolean).map((word) => ` · ${word}`)}
        </Text>
      }
    >
      <View style={styles.line}>
        <StageGlyph stage={stage} word size="small" />
        <Text size="small" strong>
          {size ? formatLength(size.meanTenthsMm, room.units) : 'not measured'}
        </Text>
      </View>
    </Row>
  );
}

/** What one costs at today's size; null where nothing is said, or money is not for this reader. */
function eachOf({ listing, size }: Offer): number | null {
  if (!listing?.prices) return null;
  return priceOf(listing.prices, { lot: 'single', heads: 1, lengthTenthsMm: size?.meanTenthsMm ?? null });
}

const styles = StyleSheet.create({
  line: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'center',
    justifyContent: 'space-between',
    columnGap: space[3],
    marginTop: space[1],
  },
});
