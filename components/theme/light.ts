import type { Theme } from './theme';

/** "Daylight". The ramp is darkened to hold 3:1 on paper. */
export const light: Theme = {
  name: 'light',
  ground: '#F6F9F9',
  sheet: '#FFFFFF',
  well: '#E8EFEF',
  ink: '#0B1C22',
  ink2: '#3B5157',
  ink3: '#536A70',
  rule: '#B9C8CA',
  ruleSoft: '#DAE4E5',
  ruleStrong: '#0B1C22',
  control: '#6B8085',
  actFill: '#0B1C22',
  actInk: '#F6F9F9',
  trouble: '#B3261B',
  troubleFill: '#B3261B',
  troubleInk: '#FFFFFF',
  troubleWash: '#FBEAE7',
  select: '#DCE8EC',
  focus: '#0A5FA6',
  band: '#CFE0EA',
  scrim: 'rgba(11,28,34,.42)',
  sheetShadow: '0 -1px 0 #6B8085, 0 -24px 48px rgba(11,28,34,.18)',
  stage: {
    egg: '#BC7500',
    wriggler: '#957700',
    fry: '#4C7F36',
    juvenile: '#1B776D',
    subadult: '#17618C',
    adult: '#1B4690',
  },
};

/** Print: the light tokens on white, whatever the screen shows. */
export const paper: Theme = { ...light, ground: '#FFFFFF' };
