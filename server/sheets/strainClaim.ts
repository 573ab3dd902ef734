import type { SheetContent } from '../../shared/sheets/content';
import { lineageNodes } from '../lineage';
import type { Scope } from '../scope';
import { oneStrain } from '../strains';
import { idsOf } from './lineagePart';
import { showsPeople } from './people';

/** The kinds that may be in a possible hybrid: the dam's and every possible sire's. */
export async function kindsOf(scope: Scope, broodId: string): Promise<string[]> {
  const nodes = await lineageNodes(scope, broodId);
  const brood = nodes.find(({ id }) => id === broodId);
  const ids = brood && !('from' in brood) ? [...idsOf(brood.sire), ...idsOf(brood.dam)] : [];
  return [...new Set(nodes.filter(({ id }) => ids.includes(id)).flatMap(({ displayName }) => displayName ?? []))];
}

/** What the sheet claims the fish to be; no strain's claim where another could be the father. */
export async function claimOf(scope: Scope, strainId: string | null, kinds: string[]): Promise<SheetContent['strain']> {
  if (!strainId) {
    const names = kinds.filter((name) => name !== '');
    return {
      claim: 'possibleHybrid',
      kinds: [...names, 'species not known', 'species not known']
        .slice(0, Math.max(2, names.length))
        .map((scientific) => ({ scientific, locality: null })),
    };
  }
  const strain = await oneStrain(scope, strainId);
  if (strain.naming === 'hybrid') {
    return {
      claim: 'hybrid',
      kinds: [
        { scientific: strain.displayName, locality: strain.locality },
        { scientific: 'another kind', locality: null },
      ],
    };
  }
  const { locality, localityKnown, citesSource } = strain;
  const showPeople = await showsPeople(scope);
  return {
    claim: 'strain',
    code: strain.code,
    scientific: strain.displayName,
    naming: strain.naming === 'lineBred' ? 'described' : strain.naming,
    tradeName: strain.tradeName,
    synonyms: strain.synonyms
      ? strain.synonyms
          .split(/[;,]/)
          .map((name) => name.trim())
          .filter(Boolean)
          .slice(0, 12)
      : [],
    locality:
      localityKnown === 'unknown' || !locality
        ? { known: 'unknown' }
        : { known: localityKnown, name: locality, waters: null },
    lineBred: strain.naming === 'lineBred' ? 'bred for looks' : null,
    founders: {
      provenance: strain.provenance,
      from: showPeople ? strain.fromWhom : null,
      on: strain.acquiredOn?.slice(0, 7) ?? null,
      papers: strain.papers,
    },
    source: citesSource === 'A' || citesSource === 'Y' ? null : citesSource,
  };
}
