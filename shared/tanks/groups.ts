import type { SpeciesProfile } from '../species/profile';
import type { Finding } from '../water/finding';
import type { Lodger } from './resident';

/** Half grown and over: what counts in a group and in its sex ratio. */
const GROWN_FROM = 0.5;

/** Group size and females per male of each species, colonies of one species taken together. Young fish do not count. */
export function groupFindings(lodgers: readonly Lodger[]): Finding[] {
  const grown = lodgers.filter(({ adults, heads }) => adults / heads >= GROWN_FROM ** 3);
  return [...new Set(grown.map(({ profile }) => profile))].flatMap((profile) => {
    const own = grown.filter((lodger) => lodger.profile === profile);
    const sum = (of: 'heads' | 'males' | 'females' | 'unsexed') => own.reduce((total, lodger) => total + lodger[of], 0);
    const sexes = { males: sum('males'), females: sum('females'), unsexed: sum('unsexed') };
    return [...groupSize(profile, sum('heads')), ...sexRatio(profile, sexes)];
  });
}

function groupSize({ name, minGroup }: SpeciesProfile, heads: number): Finding[] {
  if (heads >= minGroup.value) return [];
  return [
    {
      of: 'group',
      level: 'look',
      says: `${heads} ${name}: a group of at least ${minGroup.value} is calmer`,
      because: `${minGroup.source}.${minGroup.note ? ` ${minGroup.note}` : ''}`,
    },
  ];
}

/** With unsexed fish there is nothing to say as long as enough of them may be females. */
function sexRatio(profile: SpeciesProfile, sexes: { males: number; females: number; unsexed: number }): Finding[] {
  const { name, femalesPerMale, temper } = profile;
  const { males, females, unsexed } = sexes;
  if (males === 0 || (females + unsexed) / males >= femalesPerMale.value) return [];
  const unsure = unsexed > 0 ? `, ${unsexed} unsexed` : '';
  return [
    {
      of: 'sexRatio',
      level: females + unsexed < males ? 'act' : 'look',
      says: `${males} male and ${females} female ${name}${unsure}: ${femalesPerMale.value} females for each male`,
      because: `${femalesPerMale.source}.${temper ? ` Temper: ${temper.value}.` : ''}`,
    },
  ];
}
