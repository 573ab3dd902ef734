/** The six stages of life, in order. Stage n fills n bars of the mark. */
export const stages = ['egg', 'wriggler', 'fry', 'juvenile', 'subadult', 'adult'] as const;
export type Stage = (typeof stages)[number];

export const stageWords: Record<Stage, string> = {
  egg: 'Egg',
  wriggler: 'Wriggler',
  fry: 'Fry',
  juvenile: 'Juvenile',
  subadult: 'Subadult',
  adult: 'Adult',
};

export type ThemeName = 'dark' | 'light';

/** Every colour of the product. A hue means a stage of life or trouble, nothing else; controls are ink. */
export type Theme = {
  name: ThemeName;
  /** Page. */
  ground: string;
  /** What covers the page. */
  sheet: string;
  /** Inputs, keypad, mat of a photo. */
  well: string;
  ink: string;
  ink2: string;
  ink3: string;
  rule: string;
  ruleSoft: string;
  ruleStrong: string;
  /** Outline of what can be pressed or typed in, 3:1. */
  control: string;
  actFill: string;
  actInk: string;
  trouble: string;
  troubleFill: string;
  troubleInk: string;
  troubleWash: string;
  /** The chosen row of a list beside its detail. */
  select: string;
  focus: string;
  /** Strip window, forecast band, keeper's own range. */
  band: string;
  scrim: string;
  sheetShadow: string;
  stage: Record<Stage, string>;
};
