import { useState } from 'react';
import { SegmentedField } from '@/components/form/SegmentedField';
import { SelectField } from '@/components/form/Select';
import { TextField } from '@/components/form/TextField';
import { currencyOptions, timeZoneOptions } from './places';
import { UNIT_SYSTEMS } from './roomForm';

/** What a new fishroom and its settings both ask. */
export function RoomFields({ timeZone }: { timeZone: string }) {
  const [zones] = useState(() => timeZoneOptions(timeZone));
  const [currencies] = useState(currencyOptions);
  return (
    <>
      <TextField name="name" label="Name" needed hint="As it stands on lineage sheets and letters." />
      <TextField
        name="place"
        label="Place"
        aside="not needed"
        hint="Town or region, for the people who collect fish."
      />
      <SelectField name="timeZone" label="Time zone" options={zones} hint="Its midnight is where your days begin." />
      <SelectField name="currency" label="Currency" options={currencies} />
      <SegmentedField
        name="system"
        label="Units"
        choices={UNIT_SYSTEMS}
        hint="Everyone may choose their own. What is recorded stays the same."
      />
    </>
  );
}
