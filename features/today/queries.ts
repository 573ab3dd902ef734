import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { listMembers } from '@/shared/members/contract';
import { may } from '@/shared/roles';
import {
  endCalendar,
  type MyDay,
  newCalendar,
  readIntervals,
  readMyDay,
  readTask,
  readToday,
  setDailyLetter,
} from '@/shared/today/contract';

export const todayQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'today'],
    queryFn: ({ signal }) => call(readToday, { params: { roomId }, signal }),
  });

export const intervalsQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'intervals'],
    queryFn: ({ signal }) => call(readIntervals, { params: { roomId }, signal }),
  });

/** Who may be given a task. */
export const membersQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'members'],
    queryFn: ({ signal }) => call(listMembers, { params: { roomId }, signal }),
    select: ({ members }) => members.filter(({ role }) => may(role, 'task:write')),
  });

export const taskQuery = (roomId: string, taskId: string) =>
  queryOptions({
    queryKey: [roomId, 'tasks', taskId],
    queryFn: ({ signal }) => call(readTask, { params: { roomId, taskId }, signal }),
  });

export const myDayQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'my-day'],
    queryFn: ({ signal }) => call(readMyDay, { params: { roomId }, signal }),
  });

/** One's own letter and calendar; nobody else sees a difference. */
export function useMyDay() {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  const onSuccess = (day: MyDay) => cache.setQueryData(myDayQuery(roomId).queryKey, day);
  const params = { roomId };
  return {
    setHour: useMutation({
      mutationFn: (hour: number | null) => call(setDailyLetter, { params, body: { hour } }),
      onSuccess,
    }),
    makeCalendar: useMutation({ mutationFn: () => call(newCalendar, { params }), onSuccess }),
    dropCalendar: useMutation({ mutationFn: () => call(endCalendar, { params }), onSuccess }),
  };
}
