import { queryOptions } from '@tanstack/react-query';
import { call } from '@/features/call';
import { listMembers } from '@/shared/members/contract';
import { may } from '@/shared/roles';
import { readIntervals, readTask, readToday } from '@/shared/today/contract';

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
