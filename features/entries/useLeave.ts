import { type Href, useRouter } from 'expo-router';
import { useRoom } from '@/hooks/useRoom';

/** Back to where the form was opened; to Today where there is nothing to go back to, as after a reload or a scanned label. */
export function useLeave() {
  const room = useRoom();
  const router = useRouter();
  return (to?: Href | null) => {
    if (to) router.replace(to);
    else if (router.canGoBack()) router.back();
    else router.replace(`/r/${room.id}`);
  };
}
