import type { StrainClaim } from '@/shared/sheets/strain';

/** What a sheet claims its fish to be, in one line. */
export function claimWords(strain: StrainClaim): string {
  if (strain.claim !== 'strain') {
    const kinds = strain.kinds.map(({ scientific }) => scientific).join(' × ');
    return strain.claim === 'hybrid' ? `Hybrid of ${kinds}` : `Possible hybrid of ${kinds}`;
  }
  const place = strain.locality.known === 'unknown' ? 'locality not known' : strain.locality.name;
  return `${strain.scientific}, ${place}`;
}
