import { Landing } from '@/features/accounts/Landing';

export default function Home() {
  return <Landing />;
}
