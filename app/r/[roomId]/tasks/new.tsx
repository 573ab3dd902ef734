import { useLocalSearchParams } from 'expo-router';
import { TaskForm } from '@/features/today/TaskForm';

export default function NewTask() {
  const { tank } = useLocalSearchParams<{ tank?: string }>();
  return <TaskForm task={null} tankId={tank} />;
}
