import { type Kysely, sql } from 'kysely';

/** What lists look for in a fishroom of many years: found by key, and not by walking every row of the room. */
export async function up(db: Kysely<unknown>): Promise<void> {
  const statements = [
    'create index stayOfBatch on stay (roomId, batchId, untilDay) where batchId is not null',
    'create index stayOfColony on stay (roomId, colonyId, untilDay) where colonyId is not null',
    'create index stayOfFish on stay (roomId, fishId, untilDay) where fishId is not null',
    'create index colonyMemberOfFish on colonyMember (roomId, fishId)',
    'create index fishOfBrood on fish (roomId, broodId) where broodId is not null',
    'create index holdOfHolder on hold (roomId, holderId) where holderId is not null',
    'create index checkOfHold on holdCheck (roomId, holdId)',
    'create index stageCountOfBrood on stageCount (roomId, broodId)',
    'create index photoOfFish on photo (roomId, fishId) where fishId is not null',
    'create index photoOfBrood on photo (roomId, broodId) where broodId is not null',
    'create index photoOfBatch on photo (roomId, batchId) where batchId is not null',
    'create index photoOfColony on photo (roomId, colonyId) where colonyId is not null',
    'create index photoOfHold on photo (roomId, holdId) where holdId is not null',
    'create index photoOfTank on photo (roomId, tankId) where tankId is not null',
  ];
  for (const statement of statements) await sql.raw(statement).execute(db);
}
