import { Caution } from '@/components/ui/Caution';
import { Code } from '@/components/ui/Code';
import type { MaybeAction } from '@/components/ui/Press';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import type { ParentageTold, ParentShare } from '@/shared/holds/contract';

type Props = { parentage: ParentageTold; possibleHybrid: boolean };

/** Who the father may be: dashed with a share where it is not certain. */
export function SireRows({ parentage, possibleHybrid }: Props) {
  const { sires, paternity, basis } = parentage;
  const certain = sires.length === 1 && sires[0]?.fishId != null;
  const aside = sires.length === 0 ? 'not known' : certain ? 'certain' : 'not certain';
  return (
    <Section title="Sire of this brood" aside={aside}>
      {sires.length > 0 ? (
        <Rows label="Possible sires">
          {sires
            .toSorted((a, b) => b.share - a.share)
            .map((sire) => (
              <SireRow key={sire.fishId ?? 'notKnown'} sire={sire} certain={certain} />
            ))}
        </Rows>
      ) : (
        <Text tone="soft">Nothing is known of the father.</Text>
      )}
      <Text size="small" tone="soft" style={{ marginTop: 8 }}>
        {[basis ? `${basis}.` : '', sires.length > 1 ? paternityWords(paternity) : ''].filter(Boolean).join(' ')}
      </Text>
      {possibleHybrid ? (
        <Caution
          title="Possible hybrid"
          words="One of them is of another strain. The brood makes no strain claim until it is settled."
        />
      ) : null}
    </Section>
  );
}

const paternityWords = (paternity: ParentageTold['paternity']) =>
  paternity === 'single' ? 'One male for the whole mouthful, not known which.' : 'Several males may have sired it.';

function SireRow({ sire: { fishId, code, share }, certain }: { sire: ParentShare; certain: boolean }) {
  const { id: roomId } = useRoom();
  const percent = String(Math.round(share * 100));
  const action: MaybeAction = fishId ? { href: `/r/${roomId}/fish/${fishId}` } : {};
  const name = fishId ? (code ?? 'Not told apart') : 'A male not known';
  return (
    <Row
      {...action}
      label={`${name}, ${certain ? 'certain' : `${percent} %`}`}
      figure={percent}
      figureAfter="%"
      title={
        <Text>
          <SexShape sex="male" possible={!certain} /> {fishId && code ? <Code>{code}</Code> : name}
        </Text>
      }
      middle
    />
  );
}
