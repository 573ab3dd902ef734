import { type Href, useRouter } from 'expo-router';
import { useRef, useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { InputBox } from '@/components/form/InputBox';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { Part } from '@/features/entries/Part';
import { TankList } from '@/features/entries/TankChoice';
import { useTanks } from '@/features/entries/tanks';
import { useLeave } from '@/features/entries/useLeave';
import { useRoom } from '@/hooks/useRoom';
import { tankOnLabel } from './readLabel';
import { type CameraState, useCamera } from './useCamera';

/** A tank's label read by the camera leads to Record, or to the form that asked, with that tank. */
export function ScanScreen({ next }: { next?: string | undefined }) {
  const { id: roomId } = useRoom();
  const router = useRouter();
  const leave = useLeave();
  const { data: tanks = [] } = useTanks();
  const [stranger, setStranger] = useState(false);
  const video = useRef<HTMLVideoElement>(null);
  const go = (tankId: string) => {
    const form = next && /^[a-z-]+$/.test(next) ? `/${next}` : '';
    router.replace(`/r/${roomId}/record${form}?tank=${tankId}` as Href); // forms are routes below /record
  };
  const state = useCamera(video, (text) => {
    const tank = tankOnLabel(text, tanks);
    if (tank) go(tank.id);
    else setStranger(tanks.length > 0);
  });
  return (
    <Screen title="Scan a tank label" close={{ label: 'Close the camera', onPress: () => leave() }} low measure>
      <View style={styles.column}>
        <Viewer video={video} state={state} />
        {stranger ? <Notice tone="look" alert words="That code is not of a tank of this fishroom." /> : null}
        <Part title="Or type the code under the square">
          <InputBox
            aria-label="The code under the square"
            mono
            autoCapitalize="characters"
            placeholder="T03-7H4"
            onChangeText={(text) => {
              const tank = text.includes('-') ? tankOnLabel(text, tanks) : null;
              if (tank) go(tank.id);
            }}
          />
        </Part>
        <Part title="Or choose it">
          <TankList tanks={tanks} onPick={go} />
        </Part>
      </View>
    </Screen>
  );
}

const WORDS: Record<CameraState, string> = {
  asking: 'Waiting for the camera. Allow it when the phone asks.',
  looking: 'Hold the square code in the frame.',
  refused: 'The camera is not allowed. Allow it in the browser’s settings, or choose the tank below.',
  none: 'No camera here. Choose the tank below.',
};

function Viewer({ video, state }: { video: React.RefObject<HTMLVideoElement | null>; state: CameraState }) {
  const theme = useTheme();
  const seen = state === 'looking';
  return (
    <View style={styles.viewer}>
      <View
        style={[styles.frame, { borderColor: theme.control, backgroundColor: theme.well }, seen ? null : styles.off]}
      >
        <video ref={video} muted playsInline aria-label="Camera" style={picture} />
      </View>
      <Text role="status" tone="soft" size="small">
        {WORDS[state]}
      </Text>
    </View>
  );
}

const picture = { width: '100%', height: '100%', objectFit: 'cover', display: 'block' } as const;

const styles = StyleSheet.create({
  column: { gap: space[5] },
  viewer: { gap: space[2] },
  frame: { width: '100%', aspectRatio: 4 / 3, maxHeight: 420, borderWidth: line.control, overflow: 'hidden' },
  off: { aspectRatio: undefined, height: 0, borderWidth: 0 },
});
