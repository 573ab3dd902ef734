import { View } from 'react-native';
import { ShareBars } from '@/components/chart/ShareBars';
import { space } from '@/components/theme/space';
import { FiguresStrip } from '@/components/ui/FiguresStrip';
import { Text } from '@/components/ui/Text';
import { completenessWords, inbreedingWords, shareWords } from '@/shared/sheets/sayings';
import type { LineageFigures } from './figures';

/** Expected F with the values that it can take, how far back the pedigree reaches, and the generation. */
export function InbreedingFigures({ figures }: { figures: LineageFigures }) {
  const { inbreeding, generation, founders, unknownShare } = figures;
  const { f, outcomes, generationsKnown } = inbreeding;
  const doubtful = outcomes === null || outcomes.length > 1;
  const known = generationsKnown > 0;
  return (
    <View style={{ gap: space[2] }}>
      <FiguresStrip
        figures={[
          { figure: known ? f.toFixed(3) : '–', label: known ? (doubtful ? 'expected F' : 'F') : 'F not known' },
          { figure: String(founders.length), label: founders.length === 1 ? 'founder' : 'founders' },
          { figure: generation?.replace(/ or .*| to .*/, '') ?? 'F?', label: generationLabel(generation) },
        ]}
      />
      <Text size="small" tone="soft">
        {capital(inbreedingWords(inbreeding))}
        {known ? `. The pedigree behind it is ${completenessWords(inbreeding)}` : ''}
        {known && unknownShare > 0 ? `; ${shareWords(unknownShare)} of its genes come from parents nobody knows` : ''}.
      </Text>
    </View>
  );
}

const generationLabel = (generation: string | null): string => {
  const rest = generation?.match(/ (or|to) F\d+/)?.[0];
  return rest ? `generation,${rest}` : 'generation';
};
const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** What each founder gave, a bar for every two per cent. */
export function FoundersOf({ figures }: { figures: LineageFigures }) {
  const { founders, unknownShare } = figures;
  if (founders.length === 0) return <Text tone="soft">It is a founder itself: nothing is known before it.</Text>;
  const shares = [...founders, ...(unknownShare > 0 ? [{ key: '?', word: 'not known', share: unknownShare }] : [])];
  return (
    <ShareBars shares={shares} sentence={shares.map(({ word, share }) => `${word} ${shareWords(share)}`).join(', ')} />
  );
}
