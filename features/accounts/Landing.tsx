import { useQuery } from '@tanstack/react-query';
import { Redirect } from 'expo-router';
import { StillLoading, Trouble } from './gates';
import { lastRoom } from './lastRoom';
import { meQuery } from './queries';

/** The way in: to the fishroom used last, to making the first one, or to the door. */
export function Landing() {
  const { data: me, error, refetch } = useQuery(meQuery);
  if (me === null) return <Redirect href="/sign-in" />;
  if (me === undefined) return error ? <Trouble error={error} again={refetch} /> : <StillLoading />;
  const last = lastRoom();
  const room = me.rooms.find(({ id }) => id === last) ?? me.rooms[0];
  return <Redirect href={room ? `/r/${room.id}` : '/new-fishroom'} />;
}
