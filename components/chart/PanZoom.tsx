import { type ReactNode, useRef, useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { line, radius, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { IconButton } from '@/components/ui/IconButton';
import { type Box2d, centredOn } from '@/hooks/panZoom';
import { usePanZoom } from '@/hooks/usePanZoom';

type Props = {
  label: string;
  drawing: Box2d;
  /** At most so many px, less for a drawing that needs less; left out: all the room there is. */
  height?: number;
  /** Where to look first when the whole would be too small to read. */
  focus?: { x: number; y: number } | null;
  /** Smallest size at the start. */
  readable?: number;
  children: ReactNode;
};

/** A window on a drawing: drag, pinch, wheel, the buttons, or arrow keys with + − 0. */
export function PanZoom({ label, drawing, height, focus, readable = 0.6, children }: Props) {
  const theme = useTheme();
  const box = useRef<View>(null);
  const [window, setWindow] = useState<Box2d>({ width: 0, height: 0 });
  const { view, zoom, whole, onKeyDown } = usePanZoom(box, drawing, window, (fit) => {
    if (fit.k >= readable || !focus) return fit;
    return centredOn({ ...fit, k: readable }, focus, window);
  });
  return (
    <View style={height === undefined ? styles.fill : { height: heightFor(drawing, window.width, height) }}>
      <View
        ref={box}
        role="group"
        aria-label={`${label}. Arrow keys move it, plus and minus size it, 0 shows all of it.`}
        tabIndex={0}
        onKeyDown={onKeyDown}
        onLayout={(event) => setWindow(event.nativeEvent.layout)}
        style={[styles.fill, styles.window]}
      >
        <View
          style={[
            styles.drawing,
            {
              width: drawing.width,
              height: drawing.height,
              opacity: window.width > 0 ? 1 : 0,
              transform: [{ translateX: view.x }, { translateY: view.y }, { scale: view.k }],
            },
          ]}
        >
          {children}
        </View>
      </View>
      <View
        dataSet={{ printHide: true }}
        style={[styles.buttons, { backgroundColor: theme.ground, borderColor: theme.control }]}
      >
        <IconButton icon="plus" label="Larger" onPress={() => zoom(1.25)} />
        <IconButton icon="minus" label="Smaller" onPress={() => zoom(0.8)} />
        <IconButton icon="whole" label="Show all of it" onPress={whole} />
      </View>
    </View>
  );
}

/** Room for the buttons under the drawing as it fits the width. */
const heightFor = (drawing: Box2d, width: number, most: number): number =>
  Math.min(most, drawing.height * Math.min(1.4, Math.max(0.6, width / Math.max(1, drawing.width))) + 72);

const styles = StyleSheet.create({
  fill: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minHeight: 0 },
  window: { overflow: 'hidden', touchAction: 'none' },
  drawing: { position: 'absolute', left: 0, top: 0, transformOrigin: '0 0' },
  buttons: {
    position: 'absolute',
    right: space[2],
    bottom: space[2],
    flexDirection: 'row',
    borderWidth: line.control,
    borderRadius: radius.control,
  },
});
