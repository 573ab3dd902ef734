import type * as z from 'zod/mini';
import type { printLabels } from '../../shared/labels/contract';
import type { Label } from '../../shared/labels/label';
import { typedCode } from '../../shared/labels/typedCode';
import { Refusal } from '../../shared/refusal';
import { formatVolume } from '../../shared/unitWords';
import { colonyRows } from '../colonies';
import { roomPage } from '../rooms';
import type { Scope } from '../scope';
import { allTanks } from '../tanks';

type Asked = z.output<typeof printLabels.query>;

const idsIn = (text: string | undefined): string[] => [...new Set(text?.split(',') ?? [])];

/** What stands on the labels that were asked for, in the order in which they were. */
export async function labelsOf(
  scope: Scope,
  { tanks, colonies }: Asked,
): Promise<{ labels: Label[]; fishroom: string }> {
  const { name, units } = await roomPage(scope);
  const home = `${scope.house.config.origin}/r/${scope.roomId}`;
  const tankById = new Map((await allTanks(scope)).map((tank) => [tank.id, tank]));
  const colonyById = new Map((await colonyRows(scope)).map((colony) => [colony.id, colony]));
  const labels = [
    ...idsIn(tanks).map((id): Label => {
      const { code, place, litres } = tankById.get(id) ?? unknown('tanks', 'That tank is not in this fishroom');
      const volume = formatVolume(litres, units);
      return { kind: 'tank', code, place, volume, url: `${home}/record?tank=${id}`, typed: typedCode(code, id) };
    }),
    ...idsIn(colonies).map((id): Label => {
      const { code, displayName, locality } =
        colonyById.get(id) ?? unknown('colonies', 'That colony is not in this fishroom');
      const typed = typedCode(code, id);
      return { kind: 'colony', code, scientific: displayName, locality, url: `${home}/record?colony=${id}`, typed };
    }),
  ];
  if (labels.length === 0) throw new Refusal('invalid', 'Nothing is chosen', { tanks: 'Choose a tank or a colony' });
  return { labels, fishroom: name };
}

function unknown(field: string, says: string): never {
  throw new Refusal('invalid', says, { [field]: says });
}
