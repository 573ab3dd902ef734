import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Caution } from '@/components/ui/Caution';
import { Code } from '@/components/ui/Code';
import { FiguresStrip } from '@/components/ui/FiguresStrip';
import type { MaybeAction } from '@/components/ui/Press';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import type { OrderPage } from '@/shared/orders/contract';
import { formatVolume } from '@/shared/unitWords';

const tankAction = (roomId: string, tank: { id: string } | null): MaybeAction =>
  tank ? { href: `/r/${roomId}/tanks/${tank.id}` } : {};

/** What to catch from which tank, and what to have ready before the fish leave. */
export function CatchPart({ told }: { told: OrderPage }) {
  const room = useRoom();
  const { order, catches, packing, cautions } = told;
  const rows = catches.flatMap(({ lineId, tanks }) => {
    const line = order.lines.find(({ id }) => id === lineId);
    return tanks
      .filter(({ heads }) => heads > 0)
      .map((tank) => ({ key: `${lineId} ${tank.batchId}`, code: line?.code ?? '', ...tank }));
  });
  return (
    <Section title="To catch" aside={rows.length === 0 ? 'no fish there' : undefined}>
      <View style={{ gap: space[3] }}>
        <Rows label="To catch">
          {rows.map(({ key, code, tank, heads, balance }) => (
            <Row
              key={key}
              {...tankAction(room.id, tank)}
              label={`${heads} of ${code} from ${tank?.code ?? 'no tank'}`}
              figure={String(heads)}
              unit="fish"
              title={<Code>{code}</Code>}
              note={`${balance} there now`}
              trailing={<Text strong>{tank ? <Code>{tank.code}</Code> : 'no tank'}</Text>}
            />
          ))}
        </Rows>
        <FiguresStrip
          open
          figures={[
            { figure: String(packing.bags), label: packing.bags === 1 ? 'bag' : 'bags' },
            {
              figure: formatVolume(packing.waterL, room.units).split(' ')[0] ?? '',
              label: `${formatVolume(packing.waterL, room.units).split(' ').slice(1).join(' ')} of their water`,
            },
            { figure: String(packing.boxes), label: packing.boxes === 1 ? 'box' : 'boxes' },
          ]}
        />
        <Caution title="Before they travel" words={cautions.join('\n')} />
      </View>
    </Section>
  );
}
