import { SegmentedField } from '@/components/form/SegmentedField';
import { ROLE_WORDS, ROLES, type Role } from '@/shared/roles';

/** One of the four roles, with what it may do under it. */
export function RoleField({ role }: { role: Role }) {
  return (
    <SegmentedField
      name="role"
      label="Role"
      choices={ROLES.map((value) => ({ value, word: ROLE_WORDS[value].name }))}
      hint={ROLE_WORDS[role].says}
    />
  );
}
