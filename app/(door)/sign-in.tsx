import { useLocalSearchParams } from 'expo-router';
import { SignInScreen } from '@/features/accounts/SignInScreen';

export default function SignInPage() {
  const { next } = useLocalSearchParams<{ next?: string }>();
  return <SignInScreen next={next} />;
}
