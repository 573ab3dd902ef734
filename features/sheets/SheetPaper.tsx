import { View } from 'react-native';
import { G, Rect, Svg } from 'react-native-svg';
import { line, space } from '@/components/theme/space';
import { PaperTheme, useTheme } from '@/components/theme/ThemeProvider';
import type { Page, Paper } from '@/shared/print/page';
import { INKS } from '@/shared/print/page';
import type { SheetContent } from '@/shared/sheets/content';
import { sheetPages } from '@/shared/sheets/layout';
import type { UnitChoices } from '@/shared/units';
import { PaperMark } from './PaperMark';

type Props = { content: SheetContent; paper: Paper; checkUrl: string; units?: UnitChoices };

/** The sheet as it prints: the very marks that the PDF is painted from. */
export function SheetPaper({ content, paper, checkUrl, units }: Props) {
  const pages = sheetPages(content, paper, { checkUrl, hasPicture: false, ...(units ? { units } : {}) });
  return (
    <PaperTheme>
      <View dataSet={{ printRoot: true }} style={{ gap: space[4] }}>
        {pages.map((page, i) => (
          <PaperPage
            // biome-ignore lint/suspicious/noArrayIndexKey: a sheet's pages keep their order
            key={i}
            page={page}
            label={`Lineage sheet ${content.issue.number}, page ${i + 1}`}
            first={i === 0}
          />
        ))}
      </View>
    </PaperTheme>
  );
}

function PaperPage({ page, label, first }: { page: Page; label: string; first: boolean }) {
  const theme = useTheme();
  const { widthMm, heightMm, marks } = page;
  return (
    <View
      role="document"
      aria-label={label}
      dataSet={first ? { printKeep: true } : { printKeep: true, printBreak: true }}
      style={{
        width: '100%',
        maxWidth: 794,
        aspectRatio: widthMm / heightMm,
        backgroundColor: INKS.paper,
        borderWidth: line.row,
        borderColor: theme.rule,
      }}
    >
      <Svg width="100%" height="100%" viewBox={`0 0 ${widthMm} ${heightMm}`}>
        <Rect width={widthMm} height={heightMm} fill={INKS.paper} />
        <G>
          {marks.map((mark, i) => (
            // biome-ignore lint/suspicious/noArrayIndexKey: marks are a drawing; they never move
            <PaperMark key={i} mark={mark} />
          ))}
        </G>
      </Svg>
    </View>
  );
}
