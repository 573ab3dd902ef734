import { useMutation } from '@tanstack/react-query';
import { Redirect } from 'expo-router';
import { useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { Form } from '@/components/form/Form';
import { PasswordField } from '@/components/form/PasswordField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { TextLink } from '@/components/ui/TextLink';
import { call } from '@/features/call';
import { SignIn } from '@/shared/accounts/contract';
import { askSignInLink } from '@/shared/accounts/links';
import { Email } from '@/shared/accounts/shapes';
import { DoorFrame } from './DoorFrame';
import { useAlreadyIn, useDoor } from './door';
import { LetterSent } from './LetterSent';
import { SecondStepScreen } from './SecondStepScreen';

/** E-mail and password, or a link by e-mail. */
export function SignInScreen({ next }: { next: string | undefined }) {
  const door = useDoor(next);
  const [step, setStep] = useState<'password' | 'code'>('password');
  const link = useMutation({ mutationFn: (email: string) => call(askSignInLink, { body: { email } }) });
  const { form, notice } = useSchemaForm({
    schema: SignIn,
    start: { email: '', password: '' },
    save: async (typed) => {
      if (await door.byPassword(typed)) setStep('code');
    },
  });
  const askForLink = () => {
    const email = Email.safeParse(form.values.email);
    if (email.success) link.mutate(email.data);
    else void form.setTouched({ email: true }).then(() => form.setFieldError('email', email.error.issues[0]?.message));
  };
  const onward = useAlreadyIn(next);
  if (onward) return <Redirect href={onward} />;
  if (step === 'code') return <SecondStepScreen next={next} />;
  if (link.isSuccess) return <LetterSent email={link.variables} goodFor="15 minutes" again={() => link.reset()} />;
  const signUp = { pathname: '/sign-up', params: next ? { next } : {} } as const;
  return (
    <DoorFrame front title="Sign in" words={'Who is holding, since when,\nand whose they are.'}>
      <Form form={form} notice={notice} label="Sign in">
        <TextField name="email" label="Email" needed inputMode="email" autoComplete="email" autoCapitalize="none" />
        <PasswordField name="password" label="Password" purpose="current" />
        <View style={styles.buttons}>
          <SubmitButton label="Sign in" busyLabel="Signing in" />
          <Button
            label="Email me a sign-in link"
            grow
            busy={link.isPending}
            busyLabel="Asking for the link"
            onPress={askForLink}
          />
        </View>
      </Form>
      <View style={styles.links}>
        <TextLink label="Forgotten password" href="/forgot" />
        <TextLink label="Start a fishroom: sign up" href={signUp} />
      </View>
    </DoorFrame>
  );
}

const styles = StyleSheet.create({
  buttons: { gap: space[2] },
  links: { flexDirection: 'row', flexWrap: 'wrap', justifyContent: 'space-between', columnGap: space[5] },
});
