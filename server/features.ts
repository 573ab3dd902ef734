import type { Express } from 'express';
import { accounts } from './accounts';
import { auditTrail } from './audit';
import { broods } from './broods';
import { buyers } from './buyers';
import { colonies } from './colonies';
import { demo } from './demo';
import { fish } from './fish';
import { growth } from './growth';
import { holds } from './holds';
import type { House } from './house';
import type { Serve } from './http/serve';
import { labels } from './labels';
import { letters } from './letters';
import { lineage } from './lineage';
import { members } from './members';
import { orders } from './orders';
import { photos } from './photos';
import { plans } from './plans';
import { record } from './record';
import { rooms } from './rooms';
import { search } from './search';
import { sheets } from './sheets';
import { species } from './species';
import { strains } from './strains';
import { tanks } from './tanks';
import { today } from './today';
import { transfer } from './transfer';
import { water } from './water';

/** What a feature may add to the app. `before` stands ahead of body parsing; `pages` answers addresses outside /api. */
export type Feature = {
  before?: (app: Express, house: House) => void;
  routes?: (serve: Serve) => void;
  pages?: (app: Express, house: House) => void;
  /** Started with the server, stopped with it: workers, sweeps. */
  start?: (house: House) => Promise<{ stop(): Promise<void> } | undefined>;
};

/** Every feature of the server, in the order in which they answer. */
export const features: Feature[] = [
  accounts,
  rooms,
  members,
  auditTrail,
  letters,
  species,
  strains,
  tanks,
  colonies,
  labels,
  fish,
  holds,
  broods,
  growth,
  photos,
  water,
  today,
  search,
  lineage,
  plans,
  sheets,
  orders,
  buyers,
  record,
  transfer,
  demo,
];
