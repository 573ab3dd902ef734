import { PublicPageScreen } from '@/features/buyers/PublicPageScreen';

export default function PublicPage() {
  return <PublicPageScreen />;
}
