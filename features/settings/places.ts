import type { Option } from '@/components/form/Select';

/** The clock's offset now, "UTC+02:00". */
function offsetOf(timeZone: string): string {
  const parts = new Intl.DateTimeFormat('en', { timeZone, timeZoneName: 'longOffset' }).formatToParts(Date.now());
  return parts.find(({ type }) => type === 'timeZoneName')?.value.replace('GMT', 'UTC') ?? '';
}

/** Every zone the device knows, by its city. */
export function timeZoneOptions(current: string): Option[] {
  const known = Intl.supportedValuesOf('timeZone');
  const zones = known.includes(current) ? known : [current, ...known];
  return ['UTC', ...zones.filter((zone) => zone !== 'UTC')].map((zone) => {
    const parts = zone.replaceAll('_', ' ').split('/');
    const region = parts.slice(0, -1).join(', ');
    return { value: zone, word: parts.at(-1) ?? zone, note: [region, offsetOf(zone)].filter(Boolean).join(' · ') };
  });
}

export const deviceTimeZone = (): string => Intl.DateTimeFormat().resolvedOptions().timeZone;

export function currencyOptions(): Option[] {
  const names = new Intl.DisplayNames('en', { type: 'currency' });
  return Intl.supportedValuesOf('currency').map((code) => ({ value: code, code, word: names.of(code) ?? code }));
}

const EURO = 'AT BE CY DE EE ES FI FR GR HR IE IT LT LU LV MT NL PT SI SK'.split(' ');
const MONEY_OF: Record<string, string> = {
  ...Object.fromEntries(EURO.map((region) => [region, 'EUR'])),
  US: 'USD',
  GB: 'GBP',
  CA: 'CAD',
  AU: 'AUD',
  NZ: 'NZD',
  CH: 'CHF',
  NO: 'NOK',
  SE: 'SEK',
  DK: 'DKK',
  PL: 'PLN',
  CZ: 'CZK',
  JP: 'JPY',
  IN: 'INR',
  BR: 'BRL',
  ZA: 'ZAR',
  SG: 'SGD',
  MY: 'MYR',
  ID: 'IDR',
  TH: 'THB',
};

const deviceRegion = (): string => new Intl.Locale(globalThis.navigator?.language ?? 'en').maximize().region ?? '';

/** A first proposal from the device's own language setting; every one can be changed. */
export const deviceCurrency = (): string => MONEY_OF[deviceRegion()] ?? 'EUR';
export const deviceSystem = (): 'metric' | 'us' => (deviceRegion() === 'US' ? 'us' : 'metric');
