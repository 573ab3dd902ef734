import { useState } from 'react';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Text } from '@/components/ui/Text';
import { call } from '@/features/call';
import type { Me } from '@/shared/accounts/contract';
import { renewRecoveryCodes, turnOffSecondStep } from '@/shared/accounts/security';
import { CodeForm } from './CodeForm';
import { useAskAgain } from './queries';
import { RecoveryCodes } from './RecoveryCodes';
import { SetUpSecondStep } from './SetUpSecondStep';

type Account = Me['account'];
type Doing = 'rest' | 'settingUp' | 'turningOff' | 'renewing';

/** A code of an authenticator besides the password: on, off, or being set up. */
export function SecondStepPart({ account }: { account: Account }) {
  const askAgain = useAskAgain();
  const [doing, setDoing] = useState<Doing>('rest');
  const [codes, setCodes] = useState<string[] | null>(null);
  const done = async (next: string[] | null) => {
    await askAgain();
    setCodes(next);
    setDoing('rest');
  };
  if (codes) return <RecoveryCodes codes={codes} onKept={() => setCodes(null)} />;
  switch (doing) {
    case 'settingUp':
      return <SetUpSecondStep account={account} onDone={done} />;
    case 'turningOff':
      return (
        <CodeForm
          label="Turn off the second step"
          save={async (body) => {
            await call(turnOffSecondStep, { body });
            await done(null);
          }}
        />
      );
    case 'renewing':
      return (
        <CodeForm
          label="Make new recovery codes"
          save={async (body) => done((await call(renewRecoveryCodes, { body })).recoveryCodes)}
        />
      );
    case 'rest':
      return <AtRest isOn={account.secondStep} onChoose={setDoing} />;
  }
}

function AtRest({ isOn, onChoose }: { isOn: boolean; onChoose: (doing: Doing) => void }) {
  if (!isOn) {
    return (
      <>
        <Text tone="soft" style={{ marginBottom: space[3] }}>
          Signing in then asks for a code of an authenticator as well, so that a stolen password is not enough.
        </Text>
        <Button small label="Set up the second step" onPress={() => onChoose('settingUp')} />
      </>
    );
  }
  return (
    <>
      <Button small label="Make new recovery codes" onPress={() => onChoose('renewing')} />
      <Button small kind="text" label="Turn off the second step" onPress={() => onChoose('turningOff')} />
    </>
  );
}
