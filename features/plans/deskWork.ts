import { transfer } from 'comlink';
import type { LineageNode } from '@/shared/lineage/contract';
import { founderContributions } from '@/shared/lineage/founders';
import { kinship, packedKinship } from '@/shared/lineage/kinship';
import type { PackedKinship } from '@/shared/lineage/kinshipMatrix';
import type { PedigreeEntry } from '@/shared/lineage/pedigree';
import { type Proposal, proposeGroups } from '@/shared/lineage/proposeGroups';
import { entryOf } from './entryOf';

/** The pedigree that is planned with. */
let entries: PedigreeEntry[] = [];

export type Wanted = {
  males: string[];
  females: string[];
  counts: { males: number; females: number };
  limit: number;
};

/** What each of some fish has of each founder. */
export type FoundersEach = ReadonlyMap<string, ReadonlyMap<string, number>>;

/** All that takes long in planning. Runs in a worker; every answer is plain data. */
export const deskWork = {
  take(part: readonly LineageNode[], first: boolean): void {
    entries = [...(first ? [] : entries), ...part.map(entryOf)];
  },
  /** In the order of `ids`; handed over, not copied. */
  kinship(ids: string[]): Omit<PackedKinship, 'ids'> {
    const { classOf, values, self } = packedKinship(entries, ids);
    return transfer({ classOf, values, self }, [classOf.buffer, values.buffer, self.buffer]);
  },
  propose({ males, females, counts, limit }: Wanted): Proposal {
    return proposeGroups({
      matrix: kinship(entries, [...males, ...females]),
      males,
      females,
      chooseMales: counts.males,
      chooseFemales: counts.females,
      maxFryInbreeding: limit,
    });
  },
  founders(ids: string[]): FoundersEach {
    return new Map(ids.map((id) => [id, founderContributions(entries, [id])]));
  },
};

export type DeskWork = typeof deskWork;
