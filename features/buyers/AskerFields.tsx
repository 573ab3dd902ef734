import { TextField } from '@/components/form/TextField';

/** Who asks. */
export function AskerFields() {
  return (
    <>
      <TextField name="name" label="Your name" autoComplete="name" />
      <TextField
        name="email"
        label="Email"
        inputMode="email"
        autoCapitalize="none"
        autoComplete="email"
        hint="Only this fishroom sees it. You confirm it by a letter."
      />
      <TextField name="words" label="Anything else" aside="not needed" long />
    </>
  );
}
