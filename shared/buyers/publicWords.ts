import { formatDate, formatShortDay } from '../days';
import { formatMoney } from '../money';
import { LOT_WORDS } from '../orders/price';
import { METRIC } from '../units';
import { formatLength } from '../unitWords';
import type { AvailableFish, AvailablePage } from './available';
import { chosenLength } from './words';

/*
 * What the public page says, alike in the page as it is sent and in the app. Visitors are nobody's members: lengths are in
 * centimetres.
 */

/** "Kapampa · F2 · 4.7 cm". */
export function factsLine({ locality, lineage, lengthTenthsMm, possibleHybrid }: AvailableFish): string {
  return [
    possibleHybrid ? 'possible hybrid' : (locality ?? 'locality not known'),
    lineage.generation,
    ...(lengthTenthsMm === null ? ['not measured'] : [formatLength(lengthTenthsMm, METRIC)]),
  ].join(' · ');
}

export const eachWords = ({ eachCents }: AvailableFish, currency: string): string =>
  eachCents === null ? 'price on request' : formatMoney(eachCents, currency);

/** "pair €40.00 · group of 6 €110.00"; null without lots. */
export function lotsLine({ lots }: AvailableFish, currency: string): string | null {
  if (lots.length === 0) return null;
  return lots
    .map(
      ({ lot, heads, cents }) =>
        `${lot === 'group' ? `group of ${heads}` : LOT_WORDS[lot]} ${formatMoney(cents, currency)}`,
    )
    .join(' · ');
}

/** "from 4 cm €15.00, from 6 cm €20.00", where there is more than one class. */
export function classesLine({ classes }: AvailableFish, currency: string): string | null {
  if (classes.length < 2) return null;
  return classes
    .map(({ fromTenthsMm, cents }) => `from ${chosenLength(fromTenthsMm, METRIC)} ${formatMoney(cents, currency)}`)
    .join(', ');
}

/** "Inbreeding: expected F = 0.037; pedigree known equal to 2.0 full generations". */
export const inbreedingLine = ({ lineage }: AvailableFish): string =>
  `Inbreeding ${lineage.inbreeding}; pedigree known: ${lineage.known}.`;

/** "sire MOKA-A01 or MOKA-A02, dam MOKA-A04". */
export function parentsLine({ lineage }: AvailableFish): string {
  const side = (role: 'sire' | 'dam') => {
    const names = lineage.parents
      .filter((one) => one.role === role)
      .map(({ codes, otherwise }) => codes[0] ?? otherwise);
    return names.length > 0 ? [`${role} ${names.join(' or ')}`] : [];
  };
  return [...side('sire'), ...side('dam')].join(', ') || 'parents not known';
}

/** "About 20, half at 4 cm by 2 Jul". */
export function comingWords({ coming, available, lengthTenthsMm }: AvailableFish): string {
  if (!coming) return '';
  const length = chosenLength(coming.lengthTenthsMm, METRIC);
  const now = lengthTenthsMm === null ? '' : `, ${formatLength(lengthTenthsMm, METRIC)} now`;
  const when = coming.on ? `half at ${length} by ${formatShortDay(coming.on)}` : `not yet at ${length}`;
  return `About ${available}${now}; ${when}.`;
}

export const pageTitle = ({ name }: AvailablePage): string => `${name}: fish available`;

/** One sentence for link previews. */
export function pageDescription({ fish, words, place }: AvailablePage): string {
  const now = fish.filter(({ coming }) => coming === null);
  const list = now.map(({ available, name, locality }) => [`${available} ${name}`, locality].filter(Boolean).join(' '));
  const said = list.length > 0 ? `Available now: ${list.join(', ')}.` : 'No fish are available at the moment.';
  return [said, words?.split('\n')[0], place].filter(Boolean).join(' ').slice(0, 300);
}

export function howToAsk({ contact }: AvailablePage): string {
  const form =
    'Choose “Ask” beside the fish, say how many, and leave your address. You confirm it by a letter; then the fishroom answers.';
  return contact ? `${form} Or write: ${contact}` : form;
}

export const coverWords = ({ photo }: AvailablePage): { caption: string; on: string } | null =>
  photo && { caption: photo.caption ?? 'From this fishroom', on: formatDate(photo.takenOn) };
