import { queryOptions } from '@tanstack/react-query';
import type * as z from 'zod/mini';
import { call } from '@/features/call';
import { proposeSires } from '@/shared/holds/contract';
import { listContradictions, readParentage, readPedigree } from '@/shared/lineage/contract';

/** The whole pedigree of the fishroom; everything of the Lineage place is worked out from it here. */
export const pedigreeQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'pedigree'],
    queryFn: ({ signal }) => call(readPedigree, { params: { roomId }, query: {}, signal }),
    select: ({ nodes }) => nodes,
  });

/** One animal with all its possible ancestors and its descendants. */
export const pedigreeAroundQuery = (roomId: string, id: string) =>
  queryOptions({
    queryKey: [roomId, 'pedigree', id],
    queryFn: ({ signal }) => call(readPedigree, { params: { roomId }, query: { around: id }, signal }),
    select: ({ nodes }) => nodes,
  });

export type ParentageRead = z.output<typeof readParentage.output>;

/** The parents that can be set at a fish, a brood or a hold, with what was said of them before. */
export const parentageQuery = (roomId: string, animalId: string) =>
  queryOptions({
    queryKey: [roomId, 'pedigree', 'parents', animalId],
    queryFn: ({ signal }) => call(readParentage, { params: { roomId, animalId }, signal }),
  });

/** Who was in the tank when a mouthful was spawned, and how long each male was dominant there. */
export const siresThenQuery = (roomId: string, spawn: NonNullable<ParentageRead['spawn']>) =>
  queryOptions({
    queryKey: [roomId, 'pedigree', 'sires then', spawn.tank.id, spawn.from, spawn.until],
    queryFn: ({ signal }) => {
      const { tank, from, until } = spawn;
      return call(proposeSires, { params: { roomId, tankId: tank.id }, query: { from, until }, signal });
    },
    select: ({ sires }) => sires,
  });
export type SireThen = z.output<typeof proposeSires.output>['sires'][number];

export const contradictionsQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'pedigree', 'contradictions'],
    queryFn: ({ signal }) => call(listContradictions, { params: { roomId }, signal }),
    select: ({ contradictions }) => contradictions,
  });
