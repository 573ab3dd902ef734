import { MyDayScreen } from '@/features/today/MyDayScreen';

export default function Daily() {
  return <MyDayScreen />;
}
