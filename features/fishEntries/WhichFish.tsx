import { type Pick, PickField } from '@/components/form/PickGrid';
import { Text } from '@/components/ui/Text';
import { Part } from '@/features/entries/Part';
import type { FishRow, Sex } from '@/shared/fish/contract';

type Props = {
  fish: readonly FishRow[];
  label: string;
  /** Fish that nobody can tell apart stand for one another: one of the females, one of the males. */
  anonymous?: boolean;
  noteOf?: (fish: FishRow) => string | null;
  name?: string;
  onPicked?: (fishId: string) => void;
};

const ONE_OF: Record<Sex, string> = { male: 'A male', female: 'A female', unknown: 'An unsexed one' };

/** One fish of the tank. */
export function WhichFish({ fish, label, anonymous = false, noteOf = () => null, name = 'fishId', onPicked }: Props) {
  const coded = fish.filter(({ code }) => code !== null);
  const stem = stemOf(coded.flatMap(({ code }) => code ?? []));
  const picks: Pick[] = coded.map((one) => {
    const note = noteOf(one);
    return { value: one.id, code: (one.code ?? '').slice(stem.length), sex: one.sex, ...(note ? { note } : {}) };
  });
  const others = anonymous ? onePerSex(fish.filter(({ code }) => code === null)) : [];
  return (
    <Part title={label} aside={stem ? stem : undefined}>
      {picks.length + others.length > 0 ? (
        <PickField name={name} label={label} picks={[...picks, ...others]} {...(onPicked ? { onPicked } : {})} />
      ) : (
        <Text tone="soft">Nobody here can be told apart yet.</Text>
      )}
    </Part>
  );
}

function onePerSex(fish: FishRow[]): Pick[] {
  return (['female', 'male', 'unknown'] as const).flatMap((sex) => {
    const same = fish.filter((one) => one.sex === sex);
    const [first] = same;
    return first ? [{ value: first.id, word: ONE_OF[sex], note: `${same.length} not told apart` }] : [];
  });
}

/** What the codes have in common up to their number: DUMA-A of DUMA-A04 and DUMA-A11; empty where they differ. */
export function stemOf(codes: readonly string[]): string {
  const stems = new Set(codes.map((code) => /^(.*\D)\d+$/.exec(code)?.[1] ?? code));
  const [stem = ''] = stems;
  return stems.size === 1 && codes.every((code) => code.length > stem.length) ? stem : '';
}
