import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import * as computations from '@/shared/computations';

const NAMED = [
  'kinship',
  'inbreeding',
  'meanKinship',
  'geneDiversity',
  'founderGenomeEquivalents',
  'founderContributions',
  'founderEquivalents',
  'equivalentGenerations',
  'generationNumbers',
  'inbreedingOutcomes',
  'effectiveSize',
  'planPairing',
  'fitGrowth',
  'sampleStats',
  'shareAtLeast',
  'specificGrowthRate',
  'fultonK',
  'lengthWeight',
  'samplesNeeded',
  'holdClock',
  'learnHoldProfile',
  'headCount',
  'wilson',
  'mortalityRate',
  'unionisedAmmonia',
  'stockingCheck',
  'floorLoad',
  'ration',
  'lengthFromPhoto',
];

test.each(NAMED)('%s is exported by the one face, and listed with its source', (name) => {
  expect(typeof Reflect.get(computations, name)).toBe('function');
  expect(readFileSync('shared/computations.md', 'utf8')).toContain(`\`${name}\``);
});
