import * as z from 'zod/mini';
import { PersonName } from '@/shared/accounts/shapes';
import { UnitChoices } from '@/shared/units';

export const YouForm = z.pipe(
  z.strictObject({ name: PersonName, whose: z.enum(['room', 'own'], 'Choose one'), units: UnitChoices }),
  z.transform(({ name, whose, units }) => ({ name, choices: { units: whose === 'own' ? units : null } })),
);
