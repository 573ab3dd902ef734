import { typedCode } from '@/shared/labels/typedCode';
import type { TankRow } from '@/shared/tanks/contract';

const UUID = /[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}/g;

/**
 * The tank that a scanned label means: its address names the tank or the colony that lives there; a keeper's own sticker may
 * bear the code alone, and the short code under the square can be typed. Null: not of this fishroom.
 */
export function tankOnLabel(text: string, tanks: readonly TankRow[]): TankRow | null {
  const ids: readonly string[] = text.toLowerCase().match(UUID) ?? [];
  const byId = tanks.find(({ id, residents }) => ids.includes(id) || residents.some((one) => ids.includes(one.id)));
  if (byId) return byId;
  const word = text.trim().toLowerCase();
  const names = ({ id, code, residents }: TankRow) => [
    code,
    ...[{ id, code }, ...residents].map((one) => typedCode(one.code, one.id)),
  ];
  return tanks.find((tank) => names(tank).some((name) => name.toLowerCase() === word)) ?? null;
}
