/** A tank's label names the tank and never the fish, so that it stays right when fish move. */
type TankLabel = {
  kind: 'tank';
  code: string;
  /** "Left rack, middle". */
  place: string | null;
  /** In the fishroom's unit: "450 L". */
  volume: string | null;
  /** What the square code opens. */
  url: string;
  /** The short code under the square, to be typed where no camera is at hand. */
  typed: string;
};

/** A colony's label moves with the colony and says its strain. */
type ColonyLabel = {
  kind: 'colony';
  code: string;
  /** The strain's scientific name; null for a colony of mixed or doubtful strain. */
  scientific: string | null;
  locality: string | null;
  url: string;
  typed: string;
};

export type Label = TankLabel | ColonyLabel;

/** One label to a page, as label printers want it, or sheets to be cut. */
export type LabelPaper = 'single' | 'a4' | 'letter';
