import { useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { CheckField } from '@/components/form/CheckRow';
import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { call } from '@/features/call';
import { newId } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import { type Offer, setListing } from '@/shared/buyers/offers';
import { ClassFields } from './ClassFields';
import { listingDraft, saidIn, startOf } from './listingDraft';
import { PhotoChoice } from './PhotoChoice';
import { useAct } from './queries';

/** What the public page says of a brood: whether it stands there, its prices, a note, a photo. */
export function ListingForm({ offer }: { offer: Offer }) {
  const room = useRoom();
  const act = useAct();
  const [schema] = useState(() => listingDraft(room.currency, room.units));
  const [start] = useState(() => startOf(schema, offer, newId));
  const { form, notice } = useSchemaForm({
    schema,
    start,
    save: (draft) => {
      const params = { roomId: room.id, broodId: offer.broodId };
      const body = saidIn(draft, offer.listing?.version ?? null);
      return act.mutateAsync(() => call(setListing, { params, body }));
    },
  });
  const { currency } = room;
  return (
    <Section title="On the public page" aside={offer.listing?.listed ? 'listed' : 'not listed'}>
      <Form form={form} notice={notice} label="On the public page">
        <CheckField name="listed" label="List this brood" note={`${offer.available} available`} />
        <ClassFields offer={offer} />
        <View style={{ gap: space[3] }}>
          <Text strong>By lot</Text>
          <View style={styles.lots}>
            <Lot name="pair" label="Pair" unit={currency} />
            <Lot name="trio" label="Trio" unit={currency} />
          </View>
          <View style={styles.lots}>
            <Lot name="group" label="Group" unit={currency} />
            <Lot name="groupHeads" label="Fish in a group" unit="fish" whole />
          </View>
        </View>
        <TextField name="note" label="Note" aside="not needed" hint="Anyone can read it on the public page." long />
        <PhotoChoice name="photoId" broodId={offer.broodId} />
        <SubmitButton label="Save listing" />
      </Form>
    </Section>
  );
}

function Lot(props: { name: string; label: string; unit: string; whole?: boolean }) {
  return (
    <View style={styles.lot}>
      <NumberField {...props} aside="not needed" />
    </View>
  );
}

const styles = StyleSheet.create({
  lots: { flexDirection: 'row', flexWrap: 'wrap', gap: space[3] },
  lot: { flexGrow: 1, flexShrink: 1, flexBasis: 140, minWidth: 0 },
});
