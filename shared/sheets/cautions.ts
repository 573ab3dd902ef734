import type { SheetContent } from './content';

type Caution = SheetContent['cautions'][number];

/*
 * The cautions of a sheet, in full, since they are frozen with it. Water figures and the danger in a bag: bagged fish
 * breathe out carbon dioxide, which keeps the pH low and the ammonia they excrete ionised; opened, the gas leaves, the
 * pH rises and un-ionised ammonia with it (equilibrium of Emerson et al. 1975). The limits of 0.3 pH and 2 °C are
 * common practice, no source.
 */

const MATCH: Caution = {
  about: 'Water',
  text: 'Match within 0.3 pH and 2 °C (4 °F) before the fish go in. Water softer or harder than the table: bring it closer over days, in a tank without other fish.',
};

const BAG: Caution = {
  about: 'Long in the bag',
  text: 'No slow dripping. Once the bag is open its pH rises and the ammonia in it turns toxic. Float it closed until the temperatures agree, open it, net the fish over at once, and pour the bag’s water away.',
};

const RELEASE: Caution = {
  about: 'Never release',
  text: 'Never let fish, eggs or water go into a stream, pond or drain. Give fish you can’t keep back to a breeder or a shop.',
};

const PERMITS: Caution = {
  about: 'Law',
  text: 'Owning, selling and moving these fish may need a permit where you live: check locally. This sheet is a breeder’s record, not a permit or a health certificate.',
};

const TREATED: Caution = {
  about: 'Treatment',
  text: 'A treatment was running when these fish left. Follow its label and your veterinarian, and keep the fish apart until it has ended.',
};

/** The cautions that apply to fish that leave, in the order of need. */
export function cautionsFor(leaving: { treated: boolean }): Caution[] {
  return [...(leaving.treated ? [TREATED] : []), MATCH, BAG, RELEASE, PERMITS];
}
