import { KeyValues } from '@/components/ui/KeyValues';
import { Text } from '@/components/ui/Text';
import { ROLE_WORDS, ROLES } from '@/shared/roles';

/** The roles in the words that stand wherever one is chosen. */
export function RoleTable() {
  return (
    <KeyValues
      pairs={ROLES.map((role) => ({
        key: ROLE_WORDS[role].name,
        value: <Text size="small">{ROLE_WORDS[role].says}</Text>,
      }))}
    />
  );
}
