import { useLocalSearchParams } from 'expo-router';
import { ChangeTaskScreen } from '@/features/today/ChangeTaskScreen';

export default function ChangeTask() {
  const { taskId } = useLocalSearchParams<{ taskId: string }>();
  return <ChangeTaskScreen taskId={taskId} />;
}
