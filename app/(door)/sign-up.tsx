import { useLocalSearchParams } from 'expo-router';
import { SignUpScreen } from '@/features/accounts/SignUpScreen';

export default function SignUpPage() {
  const { next, invitation, email } = useLocalSearchParams<{ next?: string; invitation?: string; email?: string }>();
  return <SignUpScreen next={next} invitation={invitation} email={email} />;
}
