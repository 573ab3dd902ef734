import type { Finding } from '../water/finding';
import type { Lodger } from './resident';

/** Of a fish's own length, what fits in its mouth: a third, and half for a fish-eater. Common practice, no source. */
const MOUTH = { piscivore: 1 / 2, other: 1 / 3 } as const;

/** Who may eat whom, and who may cross with whom. */
export function companyFindings(lodgers: readonly Lodger[]): Finding[] {
  return [...lodgers.flatMap((eater) => meals(eater, lodgers)), ...crossings(lodgers)];
}

/** Young that live with their own kind count too: a grown-up batch in with the colony is a meal like any other. */
function meals(eater: Lodger, lodgers: readonly Lodger[]): Finding[] {
  const { largest, profile } = eater;
  if (largest === null) return [];
  const isFishEater = profile.diet?.value === 'piscivore';
  const bite = largest * (isFishEater ? MOUTH.piscivore : MOUTH.other);
  const prey = lodgers.filter((other) => other !== eater && other.smallest !== null && other.smallest <= bite);
  return prey.map(({ name, smallest }) => ({
    of: 'mouths',
    level: 'act',
    says: `${name} of ${Math.round(smallest ?? 0)} mm fit in the mouth of ${eater.name} of ${Math.round(largest)} mm`,
    because: `A fish takes what is ${isFishEater ? 'half, being a fish-eater' : 'a third'} of its own length. Common practice, no source.`,
  }));
}

function crossings(lodgers: readonly Lodger[]): Finding[] {
  return lodgers.flatMap((one, i) =>
    lodgers.slice(i + 1).flatMap((other) => {
      const because = `${one.name}: crosses with ${one.profile.crossesWith.value}. ${one.profile.crossesWith.source}.`;
      const finding = (says: string): Finding[] => [{ of: 'hybrids', level: 'look', says, because }];
      if (one.speciesId !== other.speciesId) {
        if (genusOf(one) !== genusOf(other)) return [];
        return finding(`${one.name} and ${other.name} are of one genus and may cross`);
      }
      if (one.locality === other.locality) return [];
      return finding(`${one.name} and ${other.name} are one species from two localities and will cross`);
    }),
  );
}

const genusOf = ({ profile }: Lodger) => profile.name.split(' ')[0];
