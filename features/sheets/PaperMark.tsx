import QRCode from 'qrcode';
import { Circle, G, Polygon, Polyline, Rect, Text } from 'react-native-svg';
import { family } from '@/components/theme/type';
import {
  type Face,
  INKS,
  type Mark,
  type Point,
  type QrMark,
  type ShapeMark,
  type TextMark,
} from '@/shared/print/page';
import { qrRuns } from '@/shared/print/qrRuns';

const WEIGHTS: Record<Face, string> = {
  regular: '400',
  italic: '400',
  semibold: '600',
  bold: '700',
  boldItalic: '700',
  code: '600',
};
const SHAPE_STROKE_MM = 0.46;
const points = (list: readonly Point[]): string => list.map(([x, y]) => `${x},${y}`).join(' ');

/** One mark of a printed page, in millimetres. */
export function PaperMark({ mark }: { mark: Mark }) {
  switch (mark.kind) {
    case 'text':
      return <Words mark={mark} />;
    case 'line':
      return (
        <Polyline
          points={points(mark.points)}
          fill="none"
          stroke={INKS[mark.ink]}
          strokeWidth={mark.widthMm}
          {...(mark.dashMm ? { strokeDasharray: [...mark.dashMm] } : {})}
        />
      );
    case 'area':
      return (
        <Polygon
          points={points(mark.points)}
          fill={INKS[mark.fill]}
          {...(mark.stroke ? { stroke: INKS[mark.stroke.ink], strokeWidth: mark.stroke.widthMm } : {})}
        />
      );
    case 'shape':
      return <Shape mark={mark} />;
    case 'qr':
      return <Square mark={mark} />;
    case 'picture':
      return null;
  }
}

/** A drawing drops spaces at the ends of its texts: words after a code would stick to it. */
const NO_BREAK = '\u00a0';

function Words({ mark: { x, y, text, face, sizeMm, ink, anchor, tracking } }: { mark: TextMark }) {
  return (
    <Text
      x={x}
      y={y}
      textAnchor={anchor}
      fontFamily={face === 'code' ? family.code : family.text}
      fontSize={sizeMm}
      fontWeight={WEIGHTS[face]}
      fontStyle={face === 'italic' || face === 'boldItalic' ? 'italic' : 'normal'}
      fill={INKS[ink]}
      {...(tracking ? { letterSpacing: tracking * sizeMm } : {})}
    >
      {text.replace(/^ | $/g, NO_BREAK)}
    </Text>
  );
}

function Shape({ mark: { x, y, sizeMm, sex, sure, filled } }: { mark: ShapeMark }) {
  const half = sizeMm / 2;
  const look = {
    fill: INKS[filled && sure ? 'ink' : 'paper'],
    stroke: INKS.ink,
    strokeWidth: SHAPE_STROKE_MM,
    ...(sure ? {} : { strokeDasharray: [1.05, 0.8] }),
  };
  if (sex === 'male') return <Rect x={x - half} y={y - half} width={sizeMm} height={sizeMm} {...look} />;
  if (sex === 'female') return <Circle cx={x} cy={y} r={half} {...look} />;
  const reach = half * 1.15;
  const corners: Point[] = [
    [x, y - reach],
    [x + reach, y],
    [x, y + reach],
    [x - reach, y],
  ];
  return <Polygon points={points(corners)} {...look} />;
}

function Square({ mark: { x, y, sizeMm, text, level, ink } }: { mark: QrMark }) {
  const { modules } = QRCode.create(text, { errorCorrectionLevel: level });
  const step = sizeMm / modules.size;
  return (
    <G>
      {qrRuns(modules.size, (row, column) => modules.get(row, column) === 1).map(({ row, column, length }) => (
        <Rect
          key={`${row} ${column}`}
          x={x + column * step}
          y={y + row * step}
          width={length * step}
          height={step * 1.02}
          fill={INKS[ink]}
        />
      ))}
    </G>
  );
}
