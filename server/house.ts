import type { Logger } from 'pino';
import type { Config } from './config';
import type { Db } from './db/open';
import type { Mailer } from './mail';
import type { Sink } from './mail/sink';
import type { Payments, StandIn } from './payments';
import type { Pictures } from './pictures';

/** What the server is made of, built once. Tests build the same house with a clock of their own. */
export type House = {
  config: Config;
  db: Db;
  log: Logger;
  clock: { now(): Date };
  mailer: Mailer;
  /** The local sink's letters, when no mail server is set. */
  sink: Sink | null;
  /** Null: no card payments here, money comes by hand. */
  payments: Payments | null;
  /** The card service's stand-in, when no key is set. */
  standIn: StandIn | null;
  pictures: Pictures;
  /** Printed at the start: the demo's sign-ins. */
  demoWords: string;
};
