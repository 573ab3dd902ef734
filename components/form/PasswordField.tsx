import { useState } from 'react';
import { target } from '@/components/theme/space';
import { Press } from '@/components/ui/Press';
import { Text } from '@/components/ui/Text';
import { TextField } from './TextField';

type Props = {
  name: string;
  label: string;
  hint?: string;
  /** Password managers fill in the one and propose the other. */
  purpose: 'current' | 'new';
};

/** A password that can be shown while it is typed. */
export function PasswordField({ name, label, hint, purpose }: Props) {
  const [shown, setShown] = useState(false);
  return (
    <TextField
      name={name}
      label={label}
      hint={hint}
      needed
      secureTextEntry={!shown}
      autoCapitalize="none"
      autoComplete={purpose === 'current' ? 'current-password' : 'new-password'}
      end={
        <Press
          onPress={() => setShown(!shown)}
          aria-pressed={shown}
          aria-label={`Show ${label.toLowerCase()}`}
          style={{ minHeight: target.least, minWidth: target.least, justifyContent: 'center', paddingHorizontal: 14 }}
        >
          <Text size="small" semi style={{ textDecorationLine: 'underline', textUnderlineOffset: 4 }}>
            {shown ? 'Hide' : 'Show'}
          </Text>
        </Press>
      }
    />
  );
}
