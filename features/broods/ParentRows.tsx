import { Code } from '@/components/ui/Code';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { useRoom } from '@/hooks/useRoom';
import type { ParentageTold, ParentShare } from '@/shared/holds/contract';

type Props = { parentage: ParentageTold; hold: string | null };

/** Dam and possible sires; what is not certain is drawn dashed, with its share. */
export function ParentRows({ parentage, hold }: Props) {
  const { id: roomId } = useRoom();
  const { sires, dams, paternity, basis } = parentage;
  const aside = hold ? <TextLink label="Its hold" href={`/r/${roomId}/holds/${hold}`} /> : undefined;
  return (
    <Section title="Parents" aside={aside}>
      <Rows>
        {dams.length === 0 ? <Row title="Dam not known" margin={<SexShape sex="female" possible />} /> : null}
        {dams.map((dam) => (
          <ParentRow
            key={dam.fishId ?? 'other'}
            parent={dam}
            sex="female"
            certain={dams.length === 1 && dam.fishId !== null}
          />
        ))}
        {sires.length === 0 ? <Row title="Sire not known" margin={<SexShape sex="male" possible />} /> : null}
        {sires.map((sire) => (
          <ParentRow
            key={sire.fishId ?? 'other'}
            parent={sire}
            sex="male"
            certain={sires.length === 1 && sire.fishId !== null}
          />
        ))}
      </Rows>
      {sires.length > 1 ? (
        <Text size="small" tone="soft">
          {`${paternity === 'mixed' ? 'Several males may have fathered the brood.' : 'One male fathered all, not known which.'}${basis ? ` ${basis}` : ''}`}
        </Text>
      ) : null}
    </Section>
  );
}

function ParentRow({ parent, sex, certain }: { parent: ParentShare; sex: 'male' | 'female'; certain: boolean }) {
  const { id: roomId } = useRoom();
  const { fishId, code, share } = parent;
  const name = code ?? (fishId ? 'not told apart' : `A ${sex} not known`);
  const to = fishId ? { href: `/r/${roomId}/fish/${fishId}` as const } : { href: undefined };
  return (
    <Row
      {...to}
      label={`${sex === 'male' ? 'Sire' : 'Dam'} ${name}${certain ? '' : `, ${Math.round(share * 100)} %`}`}
      margin={<SexShape sex={sex} possible={!certain} />}
      title={code ? <Code>{code}</Code> : name}
      {...(certain ? {} : { trailing: `${Math.round(share * 100)} %` })}
      middle
    />
  );
}
