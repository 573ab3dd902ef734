import { SegmentedField } from '@/components/form/SegmentedField';

/** One question a quantity; a kit's own unit is what is printed on the kit. */
const QUESTIONS = [
  {
    name: 'length',
    label: 'Lengths',
    choices: [
      ['cm', 'cm'],
      ['in', 'inches'],
    ],
  },
  {
    name: 'temperature',
    label: 'Temperature',
    choices: [
      ['C', '°C'],
      ['F', '°F'],
    ],
  },
  {
    name: 'volume',
    label: 'Volume',
    choices: [
      ['L', 'litres'],
      ['usGal', 'US gal'],
      ['impGal', 'imp gal'],
    ],
  },
  {
    name: 'hardness',
    label: 'Hardness',
    choices: [
      ['dGH', 'dGH, dKH'],
      ['ppm', 'ppm'],
    ],
  },
  {
    name: 'ammoniaAs',
    label: 'Ammonia kit measures as',
    choices: [
      ['N', 'N'],
      ['NH3', 'NH3'],
      ['NH4', 'NH4'],
    ],
  },
  {
    name: 'nitriteAs',
    label: 'Nitrite kit measures as',
    choices: [
      ['N', 'N'],
      ['NO2', 'NO2'],
    ],
  },
  {
    name: 'nitrateAs',
    label: 'Nitrate kit measures as',
    choices: [
      ['N', 'N'],
      ['NO3', 'NO3'],
    ],
  },
] as const;

export function UnitFields() {
  return QUESTIONS.map(({ name, label, choices }) => (
    <SegmentedField
      key={name}
      name={`units.${name}`}
      label={label}
      choices={choices.map(([value, word]) => ({ value, word }))}
    />
  ));
}
