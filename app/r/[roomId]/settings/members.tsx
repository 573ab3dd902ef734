import { MembersScreen } from '@/features/members/MembersScreen';

export default function MembersPage() {
  return <MembersScreen />;
}
