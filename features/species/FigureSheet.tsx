import { View } from 'react-native';
import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Sheet } from '@/components/ui/Sheet';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { line } from '@/shared/shapes';
import type { SpeciesSet } from '@/shared/species/contract';
import { FIGURE_SHAPES } from '@/shared/species/figureShapes';
import type { SpeciesProfile } from '@/shared/species/profile';
import { type EditableFigure, measureOf } from './editable';
import { useSetSpecies } from './queries';

type Props = { figure: EditableFigure; profile: SpeciesProfile; set: SpeciesSet | null; onClose: () => void };

/** One figure of a species, set by the fishroom; it says where it has it from, or goes back to the library's. */
export function FigureSheet({ figure, profile, set, onClose }: Props) {
  const { units } = useRoom();
  const change = useSetSpecies(profile.id);
  const measure = measureOf(figure.of, units);
  const now: unknown = profile[figure.name]?.value;
  const ends = Array.isArray(now) ? now : [now];
  const typed = (at: number) => (typeof ends[at] === 'number' ? String(measure.show(ends[at])) : '');
  const own = set?.figures[figure.name];
  const send = (figures: SpeciesSet['figures']) => change.mutateAsync({ version: set?.version ?? 0, figures });
  const { form, notice } = useSchemaForm({
    schema: draftOf(figure, measure.store),
    start: { low: typed(0), high: typed(1), source: own?.source ?? '' },
    save: async ({ value, source }) => {
      await send({ ...set?.figures, [figure.name]: { value, source } });
      onClose();
    },
  });
  const back = async () => {
    const { [figure.name]: _gone, ...rest } = set?.figures ?? {};
    await send(rest);
    onClose();
  };
  return (
    <Sheet open onClose={onClose} title={figure.word}>
      <Form form={form} notice={notice} label={figure.word}>
        <View style={{ gap: space[4] }}>
          <NumberField name="low" label={figure.ends === 2 ? 'From' : figure.word} unit={measure.unit} />
          {figure.ends === 2 ? <NumberField name="high" label="To" unit={measure.unit} /> : null}
          <TextField name="source" label="Where do you have it from?" hint="Your own holds, a book, a breeder" />
          <Text size="small" tone="soft">
            {`It replaces: ${profile[figure.name]?.source ?? 'not known'}`}
          </Text>
          <SubmitButton label="Set it" />
          {own ? <Button kind="text" label="Back to the library's" onPress={() => void back()} /> : null}
        </View>
      </Form>
    </Sheet>
  );
}

/** The figure's own limits, said beside the end that breaks them. */
function draftOf({ name, ends }: EditableFigure, store: (typed: number) => number) {
  const shape: z.ZodMiniType = FIGURE_SHAPES[name];
  const Draft = z.strictObject({
    low: z.optional(z.string()),
    high: z.optional(z.string()),
    source: line(200, 'Say where the figure comes from'),
  });
  return z.pipe(
    Draft,
    z.transform(({ low, high, source }, context) => {
      const numbers = [low, high].slice(0, ends).map((text) => {
        const value = Number((text ?? '').trim().replace(',', '.') || Number.NaN);
        return Number.isNaN(value) ? undefined : store(value);
      });
      const judged = shape.safeParse(ends === 2 ? numbers : numbers[0]);
      if (judged.success) return { value: judged.data, source };
      const [issue] = judged.error.issues;
      context.issues.push({
        code: 'custom',
        input: low,
        path: [issue?.path[0] === 1 ? 'high' : 'low'],
        message: issue?.message ?? 'That is not a value',
      });
      return z.NEVER;
    }),
  );
}
