import { CARE, type Care, INCIDENTS } from './care';
import { ARRIVALS, type Arrival, COLONIES, EXITS, FINDINGS, type Finding, fishCode, fishKey } from './colonies';
import { meanLengthAt } from './growth';
import type { ColonyStarted, Entry, Founders, Happening, Key, Recorded } from './shape';
import type { Teller } from './telling';

function arrived(tell: Teller, arrival: Arrival): Founders {
  const { lot, strain, on, colony, tank, males, females, anonymousFemales = 0 } = arrival;
  const stem = colony ?? strain;
  const coded = (sex: 'male' | 'female') => (n: number) => ({
    key: fishKey(stem, n),
    code: fishCode(stem, n),
    sex,
    mark: null,
  });
  return {
    what: 'founders',
    ...tell.when('founders', on, lot),
    strain: `strain:${strain}`,
    lot: `lot:${lot}`,
    colony: colony ? `colony:${colony}` : null,
    tank: tank ? `tank:${tank}` : null,
    fish: [
      ...males.map(coded('male')),
      ...females.map(coded('female')),
      ...Array.from({ length: anonymousFemales }, (_, i) => ({
        key: `fish:${stem}/f${i + 1}` as const,
        code: null,
        sex: 'female' as const,
        mark: null,
      })),
    ],
  };
}

function colonies(tell: Teller): Happening[] {
  return COLONIES.flatMap(({ code, strain, on, note, homes }) => {
    const [first, ...later] = homes;
    const started: ColonyStarted = {
      what: 'colony',
      ...tell.when('colony', on, code),
      key: `colony:${code}`,
      code,
      strain: `strain:${strain}`,
      tank: `tank:${first?.tank ?? ''}`,
      note,
    };
    const moves = later.map((home) =>
      tell.entry(home.on, code, {
        kind: 'moved',
        thing: 'colony',
        id: `colony:${code}`,
        toTankId: `tank:${home.tank}`,
        onDay: tell.day(home.on),
        note: home.note ?? null,
      }),
    );
    return [started, ...moves];
  });
}

function found(tell: Teller, finding: Finding): Entry {
  const facts = { fishId: finding.fish, onDay: tell.day(finding.on) };
  switch (finding.kind) {
    case 'sex':
      return {
        kind: 'sexSeen',
        ...facts,
        sex: finding.sex,
        how: finding.how,
        certain: finding.certain,
        note: finding.note ?? null,
      };
    case 'dominant':
      return { kind: 'dominant', ...facts, note: finding.note ?? null };
    case 'mark':
      return { kind: 'markSeen', ...facts, mark: finding.mark, note: finding.note ?? null };
    case 'toldApart':
      return { kind: 'toldApart', ...facts, code: finding.code, mark: finding.mark, note: null };
  }
}

/** Breeders to be are measured one by one. `born`: the days since which they grew. */
const MEASURED: { fish: readonly [stem: string, numbers: readonly number[]]; on: number; age: number }[] = [
  { fish: ['MOIL', [1, 2, 3, 4, 5]], on: -60, age: 602 },
  { fish: ['MOIL', [6, 7, 8, 9]], on: -60, age: 445 },
];

function measured(tell: Teller): Recorded[] {
  return MEASURED.flatMap(({ fish: [stem, numbers], on, age }) =>
    numbers.map((n) => {
      const mm = Math.round(meanLengthAt('MOIL', age, 0.94 + 0.03 * (n % 5)));
      return tell.entry(on, fishCode(stem, n), {
        kind: 'lengthSampled',
        sampleId: `sample:${fishCode(stem, n)}`,
        of: { thing: 'fish', id: fishKey(stem, n) },
        onDay: tell.day(on),
        measure: 'total',
        method: 'box',
        readings: [{ lengthTenthsMm: mm * 10, weightG: null }],
        note: null,
      });
    }),
  );
}

/** Colonies, founders, what was found out about fish, and how some left. */
export function tellFish(tell: Teller): Happening[] {
  const exits = Object.entries(EXITS).map(([fish, { on, how, cause, note }]) =>
    tell.entry(on, fish, { kind: 'fishLeft', fishId: fish, onDay: tell.day(on), how, cause, note }),
  );
  return [
    ...colonies(tell),
    ...ARRIVALS.map((arrival) => arrived(tell, arrival)),
    ...FINDINGS.map((finding) => tell.entry(finding.on, finding.fish, found(tell, finding))),
    ...exits,
    ...measured(tell),
  ];
}

function cared(tell: Teller, one: Care): Recorded[] {
  const facts = { tankId: `tank:${one.tank}`, onDay: tell.day(one.on), note: one.note ?? null };
  const careId: Key = `care:${one.tank}${one.on}`;
  const untilDay = 'until' in one && one.until !== null ? tell.day(one.until) : null;
  if (one.kind === 'seenWell') return [tell.entry(one.on, one.tank, { kind: 'seenWell', ...facts })];
  if (one.kind === 'quarantine')
    return [tell.entry(one.on, one.tank, { kind: 'quarantineStarted', careId, ...facts, untilDay, why: one.why })];
  const { what, why, dose, endedOn } = one;
  const started = tell.entry(one.on, one.tank, {
    kind: 'treatmentStarted',
    careId,
    ...facts,
    what,
    why,
    dose,
    untilDay,
  });
  if (endedOn === undefined) return [started];
  const onDay = tell.day(endedOn);
  return [started, tell.entry(endedOn, one.tank, { kind: 'treatmentEnded', careId, onDay, note: null })];
}

/** Quarantines, treatments and incidents. */
export function tellCare(tell: Teller): Recorded[] {
  const incidents = INCIDENTS.map(({ tanks, on, what, note }) =>
    tell.entry(on, what, {
      kind: 'incident',
      tankIds: tanks.map((tank) => `tank:${tank}`),
      onDay: tell.day(on),
      what,
      losses: [],
      fishDied: [],
      note,
    }),
  );
  return [...incidents, ...CARE.flatMap((one) => cared(tell, one))];
}
