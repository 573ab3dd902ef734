import type { Logger } from 'pino';
import type { Config } from './config';
import type { Db } from './db/open';
import type { Mailer } from './mail';
import type { Sink } from './mail/sink';
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
  pictures: Pictures;
  /** Printed at the start: the demo's sign-ins. */
  demoWords: string;
};
