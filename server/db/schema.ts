import type { Generated } from 'kysely';

// Made by `npm run db:types` from the migrations. Not edited by hand.

type AccountTable = {
  id: string;
  email: string;
  emailFolded: string;
  name: string;
  passwordHash: string | null;
  emailVerifiedAt: string | null;
  disabledAt: string | null;
  choices: Generated<string>;
  totpSecret: string | null;
  totpEnabledAt: string | null;
  totpLastStep: number | null;
  createdAt: string;
  version: Generated<number>;
};

type AuditTable = {
  id: string;
  roomId: string | null;
  at: string;
  actorId: string | null;
  action: string;
  about: string;
  aboutId: string | null;
  change: string | null;
  requestId: string | null;
};

type BatchTable = {
  roomId: string;
  id: string;
  startedOn: string;
  note: string | null;
  entryId: string | null;
  createdAt: string;
  version: Generated<number>;
};

type BatchSourceTable = {
  roomId: string;
  id: string;
  batchId: string;
  broodId: string;
  heads: number;
  fromDay: string;
  entryId: string | null;
};

type BroodTable = {
  roomId: string;
  id: string;
  code: string;
  holdId: string | null;
  strainId: string | null;
  parentageId: string;
  possibleHybrid: Generated<0 | 1>;
  spawnEarliest: string;
  spawnLatest: string;
  startedOn: string;
  start: 'stripped' | 'released' | 'found' | 'guarded' | 'acquired';
  note: string | null;
  entryId: string | null;
  createdAt: string;
  version: Generated<number>;
};

type BuyerTable = {
  roomId: string;
  id: string;
  accountId: string | null;
  name: string;
  email: string | null;
  phone: string | null;
  address: string | null;
  note: string | null;
  emailConfirmedAt: string | null;
  noticesStoppedAt: string | null;
  erasedAt: string | null;
  createdAt: string;
  version: Generated<number>;
};

type CheckoutTable = {
  roomId: string;
  id: string;
  purchaseId: string;
  outsideId: string;
  kind: 'deposit' | 'balance';
  cents: number;
  url: string;
  state: 'open' | 'paid' | 'expired';
  createdAt: string;
  expiresAt: string;
};

type ColonyTable = {
  roomId: string;
  id: string;
  code: string;
  strainId: string;
  startedOn: string;
  endedOn: string | null;
  planId: string | null;
  note: string | null;
  entryId: string | null;
  createdAt: string;
  version: Generated<number>;
};

type ColonyMemberTable = {
  roomId: string;
  id: string;
  colonyId: string;
  fishId: string;
  fromDay: string;
  untilDay: string | null;
  entryId: string | null;
  endEntryId: string | null;
};

type DataImportTable = {
  roomId: string;
  id: string;
  kind: 'tanks' | 'fish' | 'colonies' | 'holds' | 'broods' | 'counts' | 'samples';
  fileName: string;
  columns: string;
  units: string;
  rows: number;
  made: string;
  actorId: string;
  createdAt: string;
  undoneAt: string | null;
};

type EntryTable = {
  roomId: string;
  id: string;
  kind: string;
  content: string;
  contentHash: string;
  actorId: string;
  madeAt: string;
  receivedAt: string;
  onDay: string;
  about: string;
  undoneAt: string | null;
  undoneBy: string | null;
};

type EntryAboutTable = {
  roomId: string;
  entryId: string;
  thing: 'tank' | 'colony' | 'fish' | 'hold' | 'brood' | 'batch' | 'strain';
  thingId: string;
};

type FindingTable = {
  roomId: string;
  id: string;
  fishId: string;
  kind: 'sex' | 'dominance' | 'mark' | 'check' | 'condition';
  onDay: string;
  value: string;
  how: 'seen' | 'vented' | 'dna' | 'told' | null;
  certain: Generated<0 | 1>;
  note: string | null;
  actorId: string;
  at: string;
  entryId: string | null;
};

type FishTable = {
  roomId: string;
  id: string;
  code: string | null;
  strainId: string | null;
  origin: 'founder' | 'bred' | 'imported';
  lotId: string | null;
  batchId: string | null;
  broodId: string | null;
  parentageId: string | null;
  bornOn: string | null;
  arrivedOn: string | null;
  keptAs: Generated<'breeder' | 'holdback' | 'other'>;
  note: string | null;
  entryId: string | null;
  createdAt: string;
  version: Generated<number>;
};

type FishExitTable = {
  roomId: string;
  id: string;
  fishId: string;
  kind: 'died' | 'sold' | 'given' | 'traded' | 'auctioned' | 'lost' | 'merged';
  onDay: string;
  cause: string | null;
  mergedInto: string | null;
  note: string | null;
  entryId: string | null;
};

type ForeignFishTable = {
  roomId: string;
  issuer: string;
  foreignId: string;
  fishId: string;
  importedSheetId: string;
};

type HeadEntryTable = {
  roomId: string;
  id: string;
  batchId: string;
  kind:
    | 'opening'
    | 'loss'
    | 'cull'
    | 'recount'
    | 'movedOut'
    | 'movedIn'
    | 'heldBack'
    | 'sold'
    | 'given'
    | 'traded'
    | 'auctioned'
    | 'returned';
  onDay: string;
  at: string;
  heads: number;
  cause: 'foundDead' | 'deformed' | 'jumped' | 'eaten' | 'equipment' | 'unknown' | null;
  reverses: string | null;
  pairId: string | null;
  purchaseLineId: string | null;
  note: string | null;
  actorId: string;
  entryId: string | null;
};

type HoldTable = {
  roomId: string;
  id: string;
  colonyId: string | null;
  tankId: string;
  holderId: string | null;
  parentageId: string;
  strainId: string | null;
  spawnSeen: 0 | 1;
  spawnEarliest: string;
  spawnLatest: string;
  firstSeenOn: string;
  plan: 'strip' | 'leave';
  outcome: 'stripped' | 'released' | 'swallowed' | 'lost' | 'diedHolding' | null;
  endedOn: string | null;
  endEntryId: string | null;
  note: string | null;
  entryId: string | null;
  createdAt: string;
  version: Generated<number>;
};

type HoldCheckTable = {
  roomId: string;
  id: string;
  holdId: string;
  onDay: string;
  seen: 'holding' | 'notHolding' | 'unsure' | 'eggs' | 'wrigglers' | 'freeSwimming' | 'eyes';
  note: string | null;
  actorId: string;
  entryId: string | null;
};

type ImportedSheetTable = {
  roomId: string;
  id: string;
  issuer: string;
  number: string;
  jws: string;
  content: string;
  keyId: string | null;
  signature: 'valid' | 'keyUnknown' | 'bad';
  importedBy: string;
  createdAt: string;
  entryId: string | null;
  keysFrom: 'here' | 'address' | 'pasted' | null;
};

type InvitationTable = {
  roomId: string;
  id: string;
  email: string;
  role: 'owner' | 'keeper' | 'helper' | 'viewer';
  tokenHash: string;
  invitedBy: string;
  createdAt: string;
  expiresAt: string;
  acceptedAt: string | null;
  withdrawnAt: string | null;
};

type JobTable = {
  id: string;
  roomId: string | null;
  kind: string;
  jobKey: string;
  payload: string;
  runAt: string;
  leasedUntil: string | null;
  attempts: Generated<number>;
  lastError: string | null;
  doneAt: string | null;
  createdAt: string;
};

type LengthReadingTable = {
  roomId: string;
  sampleId: string;
  position: number;
  lengthTenthsMm: number;
  weightG: number | null;
};

type LengthSampleTable = {
  roomId: string;
  id: string;
  broodId: string | null;
  batchId: string | null;
  fishId: string | null;
  onDay: string;
  measure: 'total' | 'standard';
  method: 'ruler' | 'box' | 'photo' | 'estimate';
  note: string | null;
  actorId: string;
  entryId: string | null;
  createdAt: string;
};

type LetterTable = {
  id: string;
  roomId: string | null;
  kind: string;
  toAddress: string;
  toName: string | null;
  subject: string;
  bodyText: string;
  bodyHtml: string;
  attachments: Generated<string>;
  aboutId: string | null;
  tokenId: string | null;
  stopUrl: string | null;
  state: Generated<'waiting' | 'sent' | 'failed'>;
  attempts: Generated<number>;
  nextTryAt: string;
  lastError: string | null;
  createdAt: string;
  sentAt: string | null;
};

type ListingTable = {
  roomId: string;
  id: string;
  broodId: string | null;
  colonyId: string | null;
  listed: Generated<0 | 1>;
  classes: Generated<string>;
  lots: Generated<string>;
  note: string | null;
  photoId: string | null;
  version: Generated<number>;
};

type LotTable = {
  roomId: string;
  id: string;
  strainId: string;
  receivedOn: string;
  fromWhom: string | null;
  provenance: 'wildCaught' | 'bredElsewhere' | 'unknown';
  generation: number | null;
  heads: number | null;
  deadOnArrival: Generated<number>;
  quarantineUntil: string | null;
  papers: string | null;
  mayBeSibs: Generated<0 | 1>;
  note: string | null;
  version: Generated<number>;
};

type MailTokenTable = {
  id: string;
  purpose: 'verify' | 'signIn' | 'reset' | 'changeEmail' | 'buyer' | 'unsubscribe';
  accountId: string | null;
  email: string;
  tokenHash: string;
  payload: string | null;
  createdAt: string;
  expiresAt: string;
  usedAt: string | null;
};

type MemberTable = {
  roomId: string;
  accountId: string;
  role: 'owner' | 'keeper' | 'helper' | 'viewer';
  joinedAt: string;
  version: Generated<number>;
  letterHour: number | null;
  letterOn: string | null;
  calendarId: string | null;
  calendarHash: string | null;
};

type MessageTable = {
  roomId: string;
  id: string;
  purchaseId: string;
  fromBuyer: 0 | 1;
  actorId: string | null;
  body: string;
  at: string;
  readAt: string | null;
};

type PairingPlanTable = {
  roomId: string;
  id: string;
  name: string;
  content: string;
  state: Generated<'draft' | 'carriedOut' | 'dropped'>;
  colonyId: string | null;
  madeBy: string;
  createdAt: string;
  version: Generated<number>;
};

type ParentageTable = {
  roomId: string;
  id: string;
  rootId: string;
  turn: number;
  paternity: 'single' | 'mixed';
  basis: string | null;
  entryId: string | null;
  madeBy: string;
  madeAt: string;
};

type ParentageCandidateTable = {
  roomId: string;
  parentageId: string;
  side: 'sire' | 'dam';
  position: number;
  fishId: string | null;
  weight: number;
};

type PaymentTable = {
  roomId: string;
  id: string;
  purchaseId: string;
  kind: 'deposit' | 'balance' | 'refund' | 'lossCredit';
  method: 'card' | 'cash' | 'transfer';
  cents: number;
  onDay: string;
  at: string;
  outsideId: string | null;
  needsRefund: Generated<0 | 1>;
  note: string | null;
  actorId: string | null;
  refunds: string | null;
};

type PhotoTable = {
  roomId: string;
  id: string;
  fishId: string | null;
  broodId: string | null;
  batchId: string | null;
  colonyId: string | null;
  holdId: string | null;
  tankId: string | null;
  takenOn: string;
  takenAt: string | null;
  caption: string | null;
  width: number;
  height: number;
  bytes: number;
  sha256: string;
  actorId: string;
  entryId: string | null;
  createdAt: string;
};

type PurchaseTable = {
  roomId: string;
  id: string;
  number: number;
  buyerId: string;
  requestId: string | null;
  state:
    | 'requested'
    | 'reserved'
    | 'depositAsked'
    | 'depositPaid'
    | 'ready'
    | 'collected'
    | 'sent'
    | 'closed'
    | 'cancelled';
  way: Generated<'sale' | 'gift' | 'trade' | 'auction'>;
  discountCents: Generated<number>;
  depositCents: number | null;
  note: string | null;
  tokenHash: string;
  offeredTimes: Generated<string>;
  agreedTime: string | null;
  termsText: string | null;
  cancelledBecause: string | null;
  handedOverAt: string | null;
  handedOverBy: string | null;
  createdAt: string;
  version: Generated<number>;
};

type PurchaseLineTable = {
  roomId: string;
  id: string;
  purchaseId: string;
  broodId: string | null;
  fishId: string | null;
  lot: Generated<'single' | 'pair' | 'trio' | 'group' | 'colony'>;
  heads: number;
  cents: number;
  note: string | null;
  lostHeads: Generated<number>;
  returnedHeads: Generated<number>;
};

type ReceiptTable = {
  roomId: string;
  id: string;
  purchaseId: string;
  content: string;
  issuedOn: string;
  createdAt: string;
};

type RecoveryCodeTable = {
  accountId: string;
  codeHash: string;
  usedAt: string | null;
};

type RequestTable = {
  roomId: string;
  id: string;
  buyerId: string;
  kind: 'fish' | 'notice';
  broodId: string | null;
  strainId: string | null;
  heads: number | null;
  lengthTenthsMm: number | null;
  words: string | null;
  state: Generated<'unconfirmed' | 'waiting' | 'notified' | 'ordered' | 'closed'>;
  createdAt: string;
  confirmedAt: string | null;
  notifiedAt: string | null;
  version: Generated<number>;
  tokenHash: string | null;
  waitsForFish: Generated<0 | 1>;
};

type ReservationTable = {
  roomId: string;
  id: string;
  broodId: string;
  batchId: string | null;
  kind: 'order' | 'keep';
  heads: number;
  purchaseLineId: string | null;
  until: string | null;
  freedAt: string | null;
  note: string | null;
  createdAt: string;
  entryId: string | null;
};

type RoomTable = {
  id: string;
  name: string;
  slug: string;
  place: string | null;
  timeZone: string;
  currency: string;
  settings: Generated<string>;
  changeNumber: Generated<number>;
  deleteAfter: string | null;
  createdAt: string;
  version: Generated<number>;
};

type RoomKeyTable = {
  roomId: string;
  id: string;
  publicJwk: string;
  sealedPrivateJwk: string | null;
  createdAt: string;
  retiredAt: string | null;
};

type SessionTable = {
  id: string;
  accountId: string;
  createdAt: string;
  lastSeenAt: string;
  expiresAt: string;
  endedAt: string | null;
  device: string;
  address: string | null;
  secondStep: Generated<'notNeeded' | 'waiting' | 'passed'>;
};

type SheetTable = {
  roomId: string;
  id: string;
  number: number;
  token: string;
  fishId: string | null;
  broodId: string | null;
  purchaseLineId: string | null;
  content: string;
  jws: string;
  keyId: string;
  issuedOn: string;
  issuedBy: string;
  createdAt: string;
  replaces: string | null;
  replacedAt: string | null;
  withdrawnAt: string | null;
  withdrawnBecause: string | null;
  linkRevokedAt: string | null;
};

type SpeciesOverrideTable = {
  roomId: string;
  id: string;
  own: Generated<0 | 1>;
  scientificName: string | null;
  about: string | null;
  figures: Generated<string>;
  version: Generated<number>;
};

type StageCountTable = {
  roomId: string;
  id: string;
  broodId: string;
  onDay: string;
  total: number | null;
  eggs: number | null;
  wrigglers: number | null;
  freeSwimming: number | null;
  dead: number | null;
  deformed: number | null;
  note: string | null;
  actorId: string;
  entryId: string | null;
};

type StayTable = {
  roomId: string;
  id: string;
  tankId: string;
  colonyId: string | null;
  batchId: string | null;
  fishId: string | null;
  fromDay: string;
  untilDay: string | null;
  entryId: string | null;
  endEntryId: string | null;
};

type StrainTable = {
  roomId: string;
  id: string;
  code: string;
  speciesId: string;
  naming: Generated<'described' | 'undescribed' | 'cf' | 'aff' | 'hybrid' | 'lineBred'>;
  scientificName: string | null;
  tradeName: string | null;
  synonyms: string | null;
  locality: string | null;
  localityKnown: 'known' | 'trade' | 'unknown';
  provenance: 'wildCaught' | 'bredElsewhere' | 'unknown';
  fromWhom: string | null;
  acquiredOn: string | null;
  papers: string | null;
  citesSource: 'W' | 'R' | 'D' | 'A' | 'C' | 'F' | 'U' | 'I' | 'O' | 'X' | 'Y' | null;
  note: string | null;
  retiredOn: string | null;
  createdAt: string;
  version: Generated<number>;
};

type StripeEventTable = {
  id: string;
  type: string;
  receivedAt: string;
  outcome: string;
};

type TankTable = {
  roomId: string;
  id: string;
  code: string;
  place: string | null;
  walkOrder: Generated<number>;
  lengthTenthsMm: number | null;
  widthTenthsMm: number | null;
  heightTenthsMm: number | null;
  fillTenthsMm: number | null;
  glassTenthsMm: number | null;
  standKg: number | null;
  litres: number;
  heaterC: number | null;
  purpose: Generated<'colony' | 'growOut' | 'nursery' | 'quarantine' | 'display'>;
  note: string | null;
  retiredOn: string | null;
  createdAt: string;
  version: Generated<number>;
};

type TankCareTable = {
  roomId: string;
  id: string;
  tankId: string;
  kind: 'waterChange' | 'treatment' | 'quarantine' | 'filter' | 'seenWell' | 'incident';
  onDay: string;
  at: string;
  untilDay: string | null;
  percent: number | null;
  what: string | null;
  why: string | null;
  dose: string | null;
  note: string | null;
  actorId: string;
  entryId: string | null;
  endEntryId: string | null;
};

type TaskTable = {
  roomId: string;
  id: string;
  taskKey: string;
  title: string | null;
  about: string | null;
  dueOn: string | null;
  everyDays: number | null;
  assignedTo: string | null;
  snoozedUntil: string | null;
  doneAt: string | null;
  doneBy: string | null;
  skippedBecause: string | null;
  createdAt: string;
  version: Generated<number>;
  onWeekday: number | null;
  followsId: string | null;
};

type ToldFishTable = {
  roomId: string;
  fishId: string;
  importedSheetId: string;
  here: 0 | 1;
  entry: string;
};

type WaterReadingTable = {
  roomId: string;
  id: string;
  tankId: string;
  onDay: string;
  at: string;
  source: 'test' | 'logger';
  celsius: number | null;
  ph: number | null;
  ghCaCo3MgL: number | null;
  khCaCo3MgL: number | null;
  totalAmmoniaNMgL: number | null;
  nitriteNMgL: number | null;
  nitrateNMgL: number | null;
  conductivityUs: number | null;
  asRead: string | null;
  note: string | null;
  actorId: string;
  entryId: string | null;
};

export type Database = {
  account: AccountTable;
  audit: AuditTable;
  batch: BatchTable;
  batchSource: BatchSourceTable;
  brood: BroodTable;
  buyer: BuyerTable;
  checkout: CheckoutTable;
  colony: ColonyTable;
  colonyMember: ColonyMemberTable;
  dataImport: DataImportTable;
  entry: EntryTable;
  entryAbout: EntryAboutTable;
  finding: FindingTable;
  fish: FishTable;
  fishExit: FishExitTable;
  foreignFish: ForeignFishTable;
  headEntry: HeadEntryTable;
  hold: HoldTable;
  holdCheck: HoldCheckTable;
  importedSheet: ImportedSheetTable;
  invitation: InvitationTable;
  job: JobTable;
  lengthReading: LengthReadingTable;
  lengthSample: LengthSampleTable;
  letter: LetterTable;
  listing: ListingTable;
  lot: LotTable;
  mailToken: MailTokenTable;
  member: MemberTable;
  message: MessageTable;
  pairingPlan: PairingPlanTable;
  parentage: ParentageTable;
  parentageCandidate: ParentageCandidateTable;
  payment: PaymentTable;
  photo: PhotoTable;
  purchase: PurchaseTable;
  purchaseLine: PurchaseLineTable;
  receipt: ReceiptTable;
  recoveryCode: RecoveryCodeTable;
  request: RequestTable;
  reservation: ReservationTable;
  room: RoomTable;
  roomKey: RoomKeyTable;
  session: SessionTable;
  sheet: SheetTable;
  speciesOverride: SpeciesOverrideTable;
  stageCount: StageCountTable;
  stay: StayTable;
  strain: StrainTable;
  stripeEvent: StripeEventTable;
  tank: TankTable;
  tankCare: TankCareTable;
  task: TaskTable;
  toldFish: ToldFishTable;
  waterReading: WaterReadingTable;
};
