import { HeadShares } from '@/components/chart/HeadShares';
import { Code } from '@/components/ui/Code';
import { KeyValues } from '@/components/ui/KeyValues';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { useRoom } from '@/hooks/useRoom';
import type { Offer } from '@/shared/buyers/offers';
import { may } from '@/shared/roles';
import { ListingForm } from './ListingForm';
import { SizePart } from './SizePart';

/** A brood as it is sold: whose its heads are, how long they are, what is said of it. */
export function OfferPage({ offer }: { offer: Offer }) {
  const room = useRoom();
  const { broodId, code, displayName, locality, possibleHybrid, tanks } = offer;
  return (
    <Screen
      title={code}
      code
      subtitle={
        <Text tone="soft">
          <Text italic>{displayName ?? 'Species not settled'}</Text>
          {locality ? ` ${locality}` : ''}
        </Text>
      }
      back={`/r/${room.id}/buyers/availability`}
      actions={<TextLink label="Brood" href={`/r/${room.id}/broods/${broodId}`} />}
    >
      {possibleHybrid ? (
        <Notice
          tone="look"
          title="Possible hybrid"
          words="Another strain could be the father. The public page says so, and makes no claim to a strain."
        />
      ) : null}
      <Heads offer={offer} />
      <SizePart offer={offer} />
      {tanks.length > 0 ? (
        <Section title="Where they swim">
          <KeyValues
            pairs={[
              {
                key: tanks.length === 1 ? 'Tank' : 'Tanks',
                value: <Code>{tanks.map((tank) => tank.code).join(', ')}</Code>,
              },
            ]}
          />
        </Section>
      ) : null}
      {may(room.role, 'sale:write') ? <ListingForm key={offer.listing?.version ?? 0} offer={offer} /> : null}
    </Screen>
  );
}

function Heads({ offer: { code, heads, reserved, kept, available } }: { offer: Offer }) {
  const shares = [
    ...(reserved > 0 ? [{ key: 'reserved', heads: reserved, word: 'Reserved', kind: 'this' as const }] : []),
    ...(kept > 0 ? [{ key: 'kept', heads: kept, word: 'Kept back', kind: 'other' as const }] : []),
    ...(available > 0 ? [{ key: 'left', heads: available, word: 'Available', kind: 'left' as const }] : []),
  ];
  const says = shares.map((share) => `${share.heads} ${share.word.toLowerCase()}`).join(', ');
  return (
    <Section title={`Where the ${heads} heads stand`}>
      {reserved + kept > heads ? (
        <Notice
          tone="act"
          words={`${reserved + kept - heads} more are promised than are here. The orders say which fall short.`}
        />
      ) : null}
      <HeadShares shares={shares} sentence={`${heads} heads of ${code}: ${says}`} />
    </Section>
  );
}
