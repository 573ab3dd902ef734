import * as z from 'zod/mini';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';

/** What a look at everything that is stored found. All lists are empty when all is well. */
export const IntegrityReport = z.strictObject({
  /** 'ok', or what SQLite found wrong with its file. */
  database: z.string(),
  references: z.array(z.strictObject({ table: z.string(), to: z.string(), count: z.number() })),
  /** How many pictures were compared with their rows. */
  pictures: z.number(),
  /** Pictures whose row is there and whose files are not; whose files are not those that were stored; without a row. */
  missing: z.array(Id),
  damaged: z.array(Id),
  unclaimed: z.array(Id),
  /** Batches out of which more fish went alive than ever came in. */
  belowZero: z.array(Id),
});
export type IntegrityReport = z.output<typeof IntegrityReport>;

/** Looks at the database's file, and at this fishroom's pictures and head counts. Hashes every picture: takes a while. */
export const checkIntegrity = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/integrity',
  needs: 'data:export',
  params: inRoom({}),
  output: IntegrityReport,
});
