import { Redirect, useLocalSearchParams } from 'expo-router';

export default function Buyers() {
  const { roomId } = useLocalSearchParams<{ roomId: string }>();
  return <Redirect href={`/r/${roomId}/buyers/orders`} />;
}
