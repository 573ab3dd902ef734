/**
 * One face for every public computation: for tests, benches and readers. The browser imports the feature files, so that a
 * page loads only what it uses. Formulas, sources and checks are listed in computations.md beside this file.
 */
export { headCount } from './broods/headCount';
export type { LedgerEntry } from './broods/headEntry';
export { kaplanMeier, mortalityRate, stageSurvival, wilson } from './broods/survival';
export { fultonK, meanCondition, relativeCondition } from './growth/condition';
export { fitGrowth, type GrowthFit, type GrowthOptions } from './growth/fitGrowth';
export { gradingAdvice } from './growth/grading';
export { lengthWeight } from './growth/lengthWeight';
export { doublingDays, growthPerformance, specificGrowthRate } from './growth/rates';
export { sampleStats, samplesNeeded } from './growth/sampleStats';
export { shareAtLeast } from './growth/sizes';
export { type HoldClock, type HoldProfile, holdClock } from './holds/holdClock';
export { learnHoldProfile } from './holds/learnHoldProfile';
export { equivalentGenerations, pedigreeCompleteness } from './lineage/completeness';
export { founderGenomeEquivalents, geneDiversity, meanKinship } from './lineage/diversity';
export {
  chanceAlleleKept,
  foundersForAllele,
  inbreedingAfter,
  inbreedingRate,
  predictedGeneDiversity,
  requiredEffectiveSize,
} from './lineage/drift';
export { effectiveSize, effectiveSizeFromFamilies, harmonicEffectiveSize } from './lineage/effectiveSize';
export { founderContributions, founderEquivalents } from './lineage/founders';
export { generationNumbers } from './lineage/generations';
export { layoutLineage } from './lineage/graphLayout';
export { inbreeding } from './lineage/inbreeding';
export { kinship } from './lineage/kinship';
export type { KinshipMatrix } from './lineage/kinshipMatrix';
export { inbreedingOutcomes } from './lineage/outcomes';
export type { Candidate, Parentage, PedigreeEntry } from './lineage/pedigree';
export { planPairing } from './lineage/planPairing';
export { lengthFromPhoto } from './photos/lengthFromPhoto';
export { floorLoad } from './tanks/floorLoad';
export { ration } from './tanks/ration';
export { stockingCheck } from './tanks/stockingCheck';
export * from './units';
export { unionisedAmmonia } from './water/ammonia';
export { carbonDioxide, oxygenSaturation } from './water/gases';
