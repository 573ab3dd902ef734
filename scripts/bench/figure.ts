/** One line of the bench: ours beside the anchor that was measured in the same run. */
export type Figure = { figure: string; ours: number; anchor: number; anchorName: string; unit: string; goal?: string };

export const median = (spans: number[]): number => spans.toSorted((a, b) => a - b)[Math.floor(spans.length / 2)] ?? 0;

export const percentile = (spans: number[], share: number): number =>
  spans.toSorted((a, b) => a - b)[Math.min(spans.length - 1, Math.floor(spans.length * share))] ?? 0;
