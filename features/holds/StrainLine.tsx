import { Code } from '@/components/ui/Code';
import { Text } from '@/components/ui/Text';
import type { TankRow } from '@/shared/tanks/contract';
import type { Proposal } from './beginning';

type Props = { tank: TankRow; strain: Proposal['strains'][number] | null };

/** "DUMA in T07 · Tropheus duboisi Maswa". */
export function StrainLine({ tank, strain }: Props) {
  return (
    <Text size="small" tone="soft">
      {strain ? <Code>{strain.strainCode}</Code> : null}
      {strain ? ' in ' : 'In '}
      <Code>{tank.code}</Code>
      {strain ? (
        <>
          {' · '}
          <Text italic>{strain.displayName}</Text>
          {strain.locality ? ` ${strain.locality}` : ''}
        </>
      ) : null}
    </Text>
  );
}
