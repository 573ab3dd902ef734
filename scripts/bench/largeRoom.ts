import BetterSqlite3 from 'better-sqlite3';
import { addDays } from '../../shared/days';
import { uuidV7 } from '../../shared/ids';

/*
 * Ten years of a large fishroom, written straight into the tables of a room that exists: 5,000 fish, 2,000 broods, 20,000
 * photos' rows. Always the same, so that two runs measure the same thing.
 */

export const SIZES = { tanks: 120, colonies: 60, perColony: 9, broods: 2_000, fish: 5_000, photos: 20_000 } as const;

const DAYS = 3_650;

type Row = Record<string, string | number | null>;

export function fillRoom(file: string, today: string): void {
  const db = new BetterSqlite3(file);
  db.pragma('foreign_keys = OFF');
  const { roomId, accountId } = db
    .prepare(`select roomId, accountId from member where role = 'owner' order by joinedAt limit 1`)
    .get() as { roomId: string; accountId: string }; // the query's own two columns
  const put = (table: string, row: Row): void => {
    const full: Row = { roomId, ...row };
    const names = Object.keys(full);
    db.prepare(`insert into ${table} (${names.join(', ')}) values (${names.map(() => '?').join(', ')})`).run(
      ...Object.values(full),
    );
  };
  db.transaction(() => new Filling(put, accountId, today).all())();
  db.prepare('update room set changeNumber = changeNumber + 1 where id = ?').run(roomId);
  db.exec('analyze');
  db.close();
}

class Filling {
  #made = 0;
  #state = 4_711;
  readonly #put: (table: string, row: Row) => void;
  readonly #actorId: string;
  readonly #today: string;
  constructor(put: (table: string, row: Row) => void, actorId: string, today: string) {
    this.#put = put;
    this.#actorId = actorId;
    this.#today = today;
  }

  #id(): string {
    this.#made += 1;
    const bytes = new Uint8Array(10);
    new DataView(bytes.buffer).setUint32(6, this.#made);
    return uuidV7(1_500_000_000_000 + this.#made, bytes);
  }
  #below(limit: number): number {
    this.#state = (this.#state * 16_807) % 2_147_483_647;
    return this.#state % limit;
  }
  #day(ago: number): string {
    return addDays(this.#today, -ago);
  }
  #at(ago: number): string {
    return `${this.#day(ago)}T18:00:00.000Z`;
  }

  all(): void {
    const strainId = this.#id();
    this.#put('strain', {
      id: strainId,
      code: 'LARG',
      speciesId: 'tropheus-moorii',
      localityKnown: 'known',
      provenance: 'wildCaught',
      createdAt: this.#at(DAYS),
    });
    const tanks = Array.from({ length: SIZES.tanks }, (_, i) => this.#tank(i));
    const colonies = Array.from({ length: SIZES.colonies }, (_, i) => this.#colony(i, strainId, tanks[i] ?? ''));
    const founders = colonies.flatMap((colony) => colony.fish);
    const broods = Array.from({ length: SIZES.broods }, (_, i) => this.#brood(i, strainId, colonies, tanks));
    for (let i = founders.length; i < SIZES.fish; i += 1) this.#heldBack(i, strainId, broods, tanks);
    for (let i = 0; i < SIZES.photos; i += 1) this.#photo(i, broods);
  }

  #tank(i: number): string {
    const id = this.#id();
    this.#put('tank', {
      id,
      code: `L${i + 1}`,
      litres: 450,
      heaterC: 26,
      walkOrder: 1_000 + i,
      purpose: i < SIZES.colonies ? 'colony' : 'growOut',
      createdAt: this.#at(DAYS),
    });
    for (let ago = 0; ago < DAYS; ago += 30)
      this.#put('waterReading', {
        id: this.#id(),
        tankId: id,
        onDay: this.#day(ago),
        celsius: 25 + this.#below(20) / 10,
        ph: 8.2,
        at: this.#at(ago),
        source: 'test',
        actorId: this.#actorId,
      });
    return id;
  }

  #fish(code: string, strainId: string, more: Row): string {
    const id = this.#id();
    this.#put('fish', { id, code, strainId, keptAs: 'breeder', createdAt: this.#at(DAYS), ...more });
    const sex = this.#below(3) === 0 ? 'male' : 'female';
    this.#put('finding', {
      id: this.#id(),
      fishId: id,
      kind: 'sex',
      onDay: this.#day(30),
      value: sex,
      how: 'seen',
      actorId: this.#actorId,
      at: this.#at(30),
    });
    return id;
  }

  #colony(i: number, strainId: string, tankId: string): { id: string; tankId: string; fish: string[] } {
    const id = this.#id();
    const since = this.#day(DAYS - i * 20);
    this.#put('colony', { id, code: `LARG-${i + 1}`, strainId, startedOn: since, createdAt: this.#at(DAYS) });
    this.#put('stay', { id: this.#id(), tankId, colonyId: id, fromDay: since });
    const fish = Array.from({ length: SIZES.perColony }, (_, n) =>
      this.#fish(`LARG-${i + 1}-${n + 1}`, strainId, { origin: 'founder', arrivedOn: since }),
    );
    for (const fishId of fish) this.#put('colonyMember', { id: this.#id(), colonyId: id, fishId, fromDay: since });
    return { id, tankId, fish };
  }

  #parentage(sires: string[], dam: string, ago: number): string {
    const id = this.#id();
    this.#put('parentage', {
      id,
      rootId: id,
      turn: 1,
      paternity: 'single',
      madeBy: this.#actorId,
      madeAt: this.#at(ago),
    });
    for (const [position, fishId] of sires.entries())
      this.#put('parentageCandidate', { parentageId: id, side: 'sire', position, fishId, weight: 1 });
    this.#put('parentageCandidate', { parentageId: id, side: 'dam', position: 0, fishId: dam, weight: 1 });
    return id;
  }

  #brood(i: number, strainId: string, colonies: { id: string; tankId: string; fish: string[] }[], tanks: string[]) {
    const colony = colonies[i % colonies.length];
    if (!colony) throw new Error('No colony');
    const ago = DAYS - 60 - Math.floor((i * (DAYS - 120)) / SIZES.broods);
    const [id, batchId, holdId] = [this.#id(), this.#id(), this.#id()];
    const dam = colony.fish[2 + (i % 6)] ?? '';
    const parentageId = this.#parentage(colony.fish.slice(0, 2), dam, ago);
    this.#put('hold', {
      id: holdId,
      colonyId: colony.id,
      tankId: colony.tankId,
      holderId: dam,
      parentageId,
      strainId,
      plan: 'strip',
      spawnSeen: 1,
      firstSeenOn: this.#day(ago),
      spawnEarliest: this.#day(ago),
      spawnLatest: this.#day(ago),
      outcome: 'stripped',
      endedOn: this.#day(ago - 22),
      createdAt: this.#at(ago),
    });
    this.#put('brood', {
      id,
      code: `LARG-${10 + Math.floor(i / 300)}X${i}`,
      holdId,
      strainId,
      parentageId,
      spawnEarliest: this.#day(ago),
      spawnLatest: this.#day(ago),
      startedOn: this.#day(ago - 22),
      start: 'stripped',
      createdAt: this.#at(ago - 22),
    });
    this.#put('batch', { id: batchId, startedOn: this.#day(ago - 22), createdAt: this.#at(ago - 22) });
    this.#put('batchSource', { id: this.#id(), batchId, broodId: id, heads: 30, fromDay: this.#day(ago - 22) });
    const gone = ago > 400;
    this.#put('stay', {
      id: this.#id(),
      tankId: tanks[SIZES.colonies + (i % (tanks.length - SIZES.colonies))] ?? '',
      batchId,
      fromDay: this.#day(ago - 22),
      untilDay: gone ? this.#day(ago - 300) : null,
    });
    this.#heads(batchId, ago, gone);
    this.#samples(batchId, ago);
    return { id, batchId, ago };
  }

  #heads(batchId: string, ago: number, gone: boolean): void {
    const line = (kind: string, after: number, heads: number, cause: string | null = null) =>
      this.#put('headEntry', {
        id: this.#id(),
        batchId,
        kind,
        onDay: this.#day(Math.max(0, ago - after)),
        at: this.#at(Math.max(0, ago - after)),
        heads,
        cause,
        actorId: this.#actorId,
      });
    line('opening', 23, 30);
    line('loss', 40, 2, 'foundDead');
    line('recount', 60, 27);
    if (gone) line('sold', 300, 27);
  }

  #samples(batchId: string, ago: number): void {
    for (const after of [60, 110, 160]) {
      if (ago < after) continue;
      const id = this.#id();
      this.#put('lengthSample', {
        id,
        batchId,
        onDay: this.#day(ago - after),
        measure: 'total',
        method: 'ruler',
        actorId: this.#actorId,
        createdAt: this.#at(ago - after),
      });
      for (let position = 0; position < 12; position += 1)
        this.#put('lengthReading', {
          sampleId: id,
          position,
          lengthTenthsMm: 100 + after * 2 + this.#below(40),
        });
    }
  }

  #heldBack(
    i: number,
    strainId: string,
    broods: { id: string; batchId: string; ago: number }[],
    tanks: string[],
  ): void {
    const brood = broods[this.#below(broods.length)];
    if (!brood) throw new Error('No brood');
    const fishId = this.#fish(`LARG-H${i}`, strainId, {
      origin: 'bred',
      batchId: brood.batchId,
      broodId: brood.id,
      bornOn: this.#day(brood.ago),
    });
    const fromDay = this.#day(Math.max(0, brood.ago - 200));
    if (i % 3 === 0) {
      this.#put('stay', { id: this.#id(), tankId: tanks[this.#below(tanks.length)] ?? '', fishId, fromDay });
      return;
    }
    this.#put('fishExit', { id: this.#id(), fishId, kind: 'sold', onDay: fromDay });
  }

  #photo(i: number, broods: { id: string; ago: number }[]): void {
    const brood = broods[i % broods.length];
    this.#put('photo', {
      id: this.#id(),
      broodId: brood?.id ?? null,
      takenOn: this.#day(Math.max(0, (brood?.ago ?? 0) - 50)),
      width: 1280,
      height: 960,
      bytes: 90_000,
      sha256: '0'.repeat(64),
      actorId: this.#actorId,
      createdAt: this.#at(1),
    });
  }
}
