import { type Kysely, sql } from 'kysely';

/** Water, treatments and tasks. */
export async function up(db: Kysely<unknown>): Promise<void> {
  const statements = [
    `create table waterReading (
      roomId text not null,
      id text not null,
      tankId text not null,
      onDay text not null check (onDay is date(onDay)),
      at text not null,
      source text not null check (source in ('test', 'logger')),
      celsius real,
      ph real check (ph between 0 and 14),
      ghCaCo3MgL real check (ghCaCo3MgL >= 0),
      khCaCo3MgL real check (khCaCo3MgL >= 0),
      -- total ammonia as nitrogen
      totalAmmoniaNMgL real check (totalAmmoniaNMgL >= 0),
      nitriteNMgL real check (nitriteNMgL >= 0),
      nitrateNMgL real check (nitrateNMgL >= 0),
      conductivityUs real check (conductivityUs >= 0),
      -- what was read off the kit, in the kit's own unit: { tan: { value, unit } }
      asRead text check (asRead is null or json_valid(asRead)),
      note text,
      actorId text not null references account (id),
      entryId text,
      primary key (roomId, id),
      check (coalesce(celsius, ph, ghCaCo3MgL, khCaCo3MgL, totalAmmoniaNMgL, nitriteNMgL, nitrateNMgL, conductivityUs) is not null),
      foreign key (roomId, tankId) references tank (roomId, id),
      foreign key (roomId, entryId) references entry (roomId, id)
    ) strict`,
    'create index waterOfTank on waterReading (roomId, tankId, onDay)',
    `create table tankCare (
      roomId text not null,
      id text not null,
      tankId text not null,
      kind text not null check (kind in ('waterChange', 'treatment', 'quarantine', 'filter', 'seenWell', 'incident')),
      onDay text not null check (onDay is date(onDay)),
      at text not null,
      untilDay text check (untilDay is date(untilDay) and untilDay >= onDay),
      percent real check (percent > 0 and percent <= 100),
      what text,
      why text,
      dose text,
      note text,
      actorId text not null references account (id),
      entryId text,
      endEntryId text,
      primary key (roomId, id),
      foreign key (roomId, tankId) references tank (roomId, id),
      foreign key (roomId, entryId) references entry (roomId, id),
      foreign key (roomId, endEntryId) references entry (roomId, id)
    ) strict`,
    'create index careOfTank on tankCare (roomId, tankId, onDay)',
    // Own and recurring tasks; and what was decided about a task that the program worked out (its key).
    `create table task (
      roomId text not null references room (id) on delete cascade,
      id text not null,
      -- 'own', or the key of a task worked out from the data, such as 'headCount:<batch>:<day>'
      taskKey text not null,
      title text,
      about text check (about is null or json_valid(about)),
      dueOn text check (dueOn is date(dueOn)),
      everyDays integer check (everyDays > 0),
      assignedTo text references account (id),
      snoozedUntil text check (snoozedUntil is date(snoozedUntil)),
      doneAt text,
      doneBy text references account (id),
      skippedBecause text,
      createdAt text not null,
      version integer not null default 1,
      primary key (roomId, id)
    ) strict`,
    `create unique index oneDecisionPerTask on task (roomId, taskKey) where taskKey <> 'own'`,
  ];
  for (const statement of statements) await sql.raw(statement).execute(db);
}
