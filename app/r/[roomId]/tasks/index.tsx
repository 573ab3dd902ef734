import { TasksScreen } from '@/features/today/TasksScreen';

export default function Tasks() {
  return <TasksScreen />;
}
