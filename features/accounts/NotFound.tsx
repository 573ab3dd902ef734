import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';

/** An address that leads nowhere. */
export function NotFound() {
  return (
    <Screen title="Nothing at this address" measure>
      <Text tone="soft" style={{ marginBottom: space[5] }}>
        The address is wrong, or what was here has moved.
      </Text>
      <Button kind="primary" label="To the fishroom" href="/" />
    </Screen>
  );
}
