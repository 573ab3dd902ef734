import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import {
  changeRole,
  inviteMember,
  leaveRoom,
  listMembers,
  removeMember,
  resendInvitation,
  withdrawInvitation,
} from '@/shared/members/contract';
import type { Role } from '@/shared/roles';

export const membersQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'members'],
    queryFn: ({ signal }) => call(listMembers, { params: { roomId }, signal }),
  });

/** Changes of members; a change of one's own role shows in the frame around as well. */
export function useMemberChanges() {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  const onSuccess = () =>
    Promise.all([cache.invalidateQueries({ queryKey: [roomId] }), cache.invalidateQueries({ queryKey: ['me'] })]);
  return {
    setRole: useMutation({
      mutationFn: ({ accountId, ...body }: { accountId: string; role: Role; version: number }) =>
        call(changeRole, { params: { roomId, accountId }, body }),
      onSuccess,
    }),
    remove: useMutation({
      mutationFn: (accountId: string) => call(removeMember, { params: { roomId, accountId } }),
      onSuccess,
    }),
    leave: useMutation({ mutationFn: () => call(leaveRoom, { params: { roomId } }), onSuccess }),
    invite: useMutation({
      mutationFn: (body: { email: string; role: Role }) => call(inviteMember, { params: { roomId }, body }),
      onSuccess,
    }),
    withdraw: useMutation({
      mutationFn: (invitationId: string) => call(withdrawInvitation, { params: { roomId, invitationId } }),
      onSuccess,
    }),
    sendAgain: useMutation({
      mutationFn: (invitationId: string) => call(resendInvitation, { params: { roomId, invitationId } }),
      onSuccess,
    }),
  };
}
