import type { SpeciesProfile } from './profile';
import type { LengthType } from './species';

/** Total length in one standard length, tail included, filaments not. Assumed: no species of the library is measured. */
export const TL_PER_SL = 1.25;

export type Sex = 'male' | 'female' | null;

/** Adult total length in mm; of both sexes together when `sex` is null, and null when the profile has neither. */
export function adultMm(profile: SpeciesProfile, sex: Sex): number | null {
  const male = totalMm(profile.adultMale?.value ?? null);
  const female = totalMm(profile.adultFemale?.value ?? null);
  if (sex === 'male') return male ?? female;
  if (sex === 'female') return female ?? male;
  return male !== null && female !== null ? (male + female) / 2 : (male ?? female);
}

/** A length whose kind is not stated is taken as total length. */
function totalMm(length: { mm: number; type: LengthType | null } | null): number | null {
  return length && (length.type === 'SL' ? length.mm * TL_PER_SL : length.mm);
}

const AGREED_WITHIN = 0.12;
const PHI_PRIME = 2.3;
const [SLOWEST, FASTEST] = [0.2, 1.1];

export type AdultSizePrior = { meanMm: number; sdMm: number; kPerYear: number; source: string };

/**
 * What the species' adult size says about a brood's growth before the data do: the final length in mm with its standard
 * deviation, and K per year, in the length type that the samples are measured in. Sources agree on adult length within
 * about 12 % (assumed); unsexed fish add half the difference of the sexes. K follows from phi' = log10 K + 2 log10 L(cm) = 2.3,
 * kept between 0.2 and 1.1: the middle of the northern Tanganyika cichlids of Niyonkuru, Isumbisho & Moreau
 * (http://jalsnet.com/journal/index/2168). A curve set by the fishroom goes first. Null without an adult length.
 */
export function adultSizePrior(profile: SpeciesProfile, sex: Sex, measuredAs: LengthType): AdultSizePrior | null {
  const total = adultMm(profile, sex);
  if (total === null) return null;
  const scale = measuredAs === 'SL' ? 1 / TL_PER_SL : 1;
  const { growth, adultMale, adultFemale } = profile;
  if (growth?.standing === 'room') {
    const meanMm = (growth.value.type === 'SL' ? growth.value.linfMm * TL_PER_SL : growth.value.linfMm) * scale;
    return { meanMm, sdMm: AGREED_WITHIN * meanMm, kPerYear: growth.value.kPerYear, source: growth.source };
  }
  const between = sex === null ? (adultMm(profile, 'male') ?? total) - (adultMm(profile, 'female') ?? total) : 0;
  const known = sex === 'female' ? (adultFemale ?? adultMale) : (adultMale ?? adultFemale);
  return {
    meanMm: total * scale,
    sdMm: Math.hypot(AGREED_WITHIN * total, between / 2) * scale,
    kPerYear: Math.min(FASTEST, Math.max(SLOWEST, 10 ** (PHI_PRIME - 2 * Math.log10(total / 10)))),
    source: known?.source ?? '',
  };
}
