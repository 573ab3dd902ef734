import { Redirect } from 'expo-router';
import { Form } from '@/components/form/Form';
import { PasswordField } from '@/components/form/PasswordField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { TextLink } from '@/components/ui/TextLink';
import { SignUp } from '@/shared/accounts/contract';
import { PASSWORD_MIN } from '@/shared/accounts/shapes';
import { DoorFrame } from './DoorFrame';
import { useAlreadyIn, useDoor } from './door';

type Props = {
  next: string | undefined;
  /** From an invitation's page: the address it went to counts as confirmed. */
  invitation: string | undefined;
  email: string | undefined;
};

/** Name, address, password. */
export function SignUpScreen({ next, invitation, email }: Props) {
  const door = useDoor(next);
  const { form, notice } = useSchemaForm({
    schema: SignUp,
    start: { name: '', email: email ?? '', password: '', ...(invitation ? { invitation } : {}) },
    save: door.signUp,
  });
  const onward = useAlreadyIn(next);
  if (onward) return <Redirect href={onward} />;
  const signIn = { pathname: '/sign-in', params: next ? { next } : {} } as const;
  return (
    <DoorFrame title="Sign up" words="For breeders and everyone who helps in their fishrooms.">
      <Form form={form} notice={notice} label="Sign up">
        <TextField name="name" label="Your name" needed autoComplete="name" hint="Stands beside what you record." />
        <TextField name="email" label="Email" needed inputMode="email" autoComplete="email" autoCapitalize="none" />
        <PasswordField
          name="password"
          label="Password"
          purpose="new"
          hint={`${PASSWORD_MIN} letters or more. A few words of your own are easy to type with wet hands.`}
        />
        <SubmitButton label="Sign up" busyLabel="Signing up" />
      </Form>
      <TextLink label="I have an account: sign in" href={signIn} />
    </DoorFrame>
  );
}
