import { useQuery } from '@tanstack/react-query';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { useLast } from '@/features/entries/useLast';
import { useRoom } from '@/hooks/useRoom';
import { taskQuery } from './queries';
import { TaskForm } from './TaskForm';

/** A task of the fishroom's own, opened to be changed. */
export function ChangeTaskScreen({ taskId }: { taskId: string }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(taskQuery(room.id, taskId));
  const task = useLast(data);
  if (task) return <TaskForm key={task.version} task={task} />;
  return (
    <Screen title="Task" back={`/r/${room.id}/tasks`}>
      {error ? (
        <ErrorState title="The task could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the task" />
      )}
    </Screen>
  );
}
