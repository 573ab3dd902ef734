import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { endOneSession, endOtherSessions, listSessions, type SessionLine } from '@/shared/accounts/security';
import { dayOf, dayWords } from '@/shared/days';

const sessionsQuery = queryOptions({
  queryKey: ['sign-ins'],
  queryFn: ({ signal }) => call(listSessions, { signal }),
});

/** Every device that is signed in as this person; each can be signed out from here. */
export function SignInsScreen() {
  const room = useRoom();
  const { data, error, refetch } = useQuery(sessionsQuery);
  return (
    <Screen title="Sign-ins" back={`/r/${room.id}/settings`} measure>
      {error ? <ErrorState title="Not loaded" words={error.message} onRetry={refetch} /> : null}
      {data ? <Sessions sessions={data.sessions} /> : error ? null : <Loading label="Loading sign-ins" rows={3} />}
    </Screen>
  );
}

function Sessions({ sessions }: { sessions: SessionLine[] }) {
  const cache = useQueryClient();
  const onSuccess = () => cache.invalidateQueries(sessionsQuery);
  const endOne = useMutation({
    mutationFn: (sessionId: string) => call(endOneSession, { params: { sessionId } }),
    onSuccess,
  });
  const endOthers = useMutation({ mutationFn: () => call(endOtherSessions), onSuccess });
  const error = endOne.error ?? endOthers.error;
  return (
    <>
      {error ? <Notice tone="act" alert words={error.message} /> : null}
      <Rows label="Sign-ins">
        {sessions.map((session) => (
          <SessionRow
            key={session.id}
            session={session}
            busy={endOne.isPending && endOne.variables === session.id}
            onEnd={() => endOne.mutate(session.id)}
          />
        ))}
      </Rows>
      {sessions.length > 1 ? (
        <View style={{ marginTop: space[5] }}>
          <Button
            label="Sign out all other devices"
            busy={endOthers.isPending}
            busyLabel="Signing out"
            onPress={() => endOthers.mutate()}
          />
        </View>
      ) : null}
    </>
  );
}

function SessionRow({ session, busy, onEnd }: { session: SessionLine; busy: boolean; onEnd: () => void }) {
  const { timeZone, today } = useRoom();
  const words = (instant: string) => dayWords(dayOf(Date.parse(instant), timeZone), today);
  const where = session.address ? ` · from ${session.address}` : '';
  return (
    <Row
      title={session.device}
      note={`Signed in ${words(session.createdAt)}, last used ${words(session.lastSeenAt)}${where}`}
      trailing={session.current ? 'this device' : undefined}
      action={
        session.current ? undefined : (
          <Button
            kind="text"
            small
            label="Sign out"
            busyLabel="Signing out"
            busy={busy}
            describe={`Sign out ${session.device}`}
            onPress={onEnd}
          />
        )
      }
    />
  );
}
