import { useQuery } from '@tanstack/react-query';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { useRoom } from '@/hooks/useRoom';
import { CalendarPart } from './CalendarPart';
import { LetterPart } from './LetterPart';
import { myDayQuery } from './queries';

/** What one has sent to oneself of the day: a letter, a calendar. */
export function MyDayScreen() {
  const room = useRoom();
  const { data, error, refetch } = useQuery(myDayQuery(room.id));
  return (
    <Screen title="Daily letter and calendar" back={`/r/${room.id}/settings`} measure>
      {data ? (
        <>
          <LetterPart hour={data.letterHour} />
          <CalendarPart url={data.calendarUrl} />
        </>
      ) : error ? (
        <ErrorState title="This could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading your day" rows={2} />
      )}
    </Screen>
  );
}
