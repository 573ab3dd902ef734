import { Caution } from '@/components/ui/Caution';
import { KeyValues } from '@/components/ui/KeyValues';
import { Section } from '@/components/ui/Section';
import { useRoom } from '@/hooks/useRoom';
import { BadValue } from '@/shared/badValue';
import type { TankRow } from '@/shared/tanks/contract';
import { FLOOR_CAUTION, type FloorLoad, floorLoad } from '@/shared/tanks/floorLoad';
import { formatFloorLoad, formatMass, formatSide, formatVolume } from '@/shared/unitWords';

/** How heavy the filled tank is, once its sides are known. */
export function FloorPart({ tank }: { tank: TankRow }) {
  const { units } = useRoom();
  const load = loadOf(tank);
  if (load === null) return null;
  const { lengthTenthsMm: length, widthTenthsMm: width, heightTenthsMm: height } = tank;
  return (
    <Section title="Weight" aside="filled">
      {typeof load === 'string' ? (
        <Caution words={load} />
      ) : (
        <>
          <KeyValues
            right
            pairs={[
              {
                key: 'Sides',
                value: [length, width, height].map((side) => formatSide(side ?? 0, units)).join(' × '),
              },
              {
                key: 'Water by the sides',
                value: formatVolume(load.waterLitres, units),
                note: `${formatVolume(tank.litres, units)} set`,
              },
              { key: 'Water and glass', value: formatMass(load.waterKg + load.glassKg, units) },
              { key: 'In all', value: formatMass(load.totalKg, units) },
              { key: 'On the floor under it', value: formatFloorLoad(load.kgPerM2, units) },
            ]}
          />
          <Caution words={FLOOR_CAUTION} />
        </>
      )}
    </Section>
  );
}

/** Null: not all sides are known. A string: why they cannot be. */
function loadOf(tank: TankRow): FloorLoad | string | null {
  const { lengthTenthsMm, widthTenthsMm, heightTenthsMm, fillTenthsMm, glassTenthsMm, standKg } = tank;
  if (!lengthTenthsMm || !widthTenthsMm || !heightTenthsMm || !fillTenthsMm || !glassTenthsMm) return null;
  try {
    return floorLoad({
      lengthMm: lengthTenthsMm / 10,
      widthMm: widthTenthsMm / 10,
      heightMm: heightTenthsMm / 10,
      fillMm: fillTenthsMm / 10,
      glassMm: glassTenthsMm / 10,
      standKg: standKg ?? 0,
    });
  } catch (error) {
    if (error instanceof BadValue) return error.message;
    throw error;
  }
}
