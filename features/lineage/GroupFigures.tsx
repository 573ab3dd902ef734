import { useState } from 'react';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { FiguresStrip } from '@/components/ui/FiguresStrip';
import { Sheet } from '@/components/ui/Sheet';
import { Text } from '@/components/ui/Text';
import { shareWords } from '@/shared/sheets/sayings';
import type { GroupFacts } from './founderFacts';

type Explained = { figure: string; label: string; title: string; words: string };

/** Headline figures of a group of breeders; each says what it rests on when it is pressed. */
export function GroupFigures({ facts, fish }: { facts: GroupFacts; fish: number }) {
  const [open, setOpen] = useState<Explained | null>(null);
  const behind = behindWords(facts, fish);
  return (
    <View style={{ gap: space[2], marginBottom: space[5] }}>
      <FiguresStrip
        figures={explained(facts).map((one) => ({
          figure: one.figure,
          label: one.label,
          onPress: () => setOpen(one),
        }))}
      />
      <Text size="small" tone="soft">
        {behind}
      </Text>
      <Sheet open={open !== null} onClose={() => setOpen(null)} title={open?.title ?? ''}>
        <View style={{ gap: space[3], paddingBottom: space[3] }}>
          <Text>{open?.words}</Text>
          <Text tone="soft">{behind}</Text>
        </View>
      </Sheet>
    </View>
  );
}

function explained({ founders, equivalents, genomes, diversity }: GroupFacts): Explained[] {
  const carried = founders.filter(({ standing }) => standing !== 'lost').length;
  return [
    {
      figure: String(carried),
      label: carried === 1 ? 'founder' : 'founders',
      title: 'Founders',
      words: 'Fish without recorded parents whose genes are still in these breeders and holdbacks.',
    },
    {
      figure: equivalents.toFixed(1),
      label: 'equivalents',
      title: 'Founder equivalents',
      words:
        'So many founders with equal shares would spread the genes as evenly: 1 by the sum of the squared shares (Lacy 1989). It falls when a few founders gave most.',
    },
    {
      figure: genomes.toFixed(1),
      label: 'genomes',
      title: 'Founder genome equivalents',
      words:
        'So many unrelated founders would hold as much gene diversity: 1 by twice the mean kinship (Lacy 1989). It also sees what was lost by chance.',
    },
    {
      figure: diversity.toFixed(2),
      label: 'diversity',
      title: 'Gene diversity',
      words:
        '1 less the mean kinship of all pairs, each fish with itself included (Lacy 1995). 1 would be a whole wild population.',
    },
  ];
}

function behindWords({ depth, unknownShare }: GroupFacts, fish: number): string {
  const unknown = unknownShare > 0 ? `; ${shareWords(unknownShare)} of the genes come from parents nobody knows` : '';
  return `${fish} fish. The pedigrees behind them are known equal to ${depth.toFixed(1)} full generations on average${unknown}. Founders are taken as unrelated.`;
}

/** "2 at risk, 1 gone". */
export function founderSummary({ founders }: GroupFacts): string {
  const count = (...of: string[]) => founders.filter(({ standing }) => of.includes(standing)).length;
  const [risk, lost] = [count('risk', 'alone'), count('lost')];
  const parts = [risk > 0 ? `${risk} at risk` : '', lost > 0 ? `${lost} gone` : ''].filter(Boolean);
  return parts.length > 0 ? parts.join(', ') : 'none at risk';
}
