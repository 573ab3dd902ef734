/** The six bars of the mark, mouth to tail, on a field of 28.4 by 24. */
export const markBars = [
  '0,10.6 3.4,7.4 3.4,16.4 0,13.6',
  '5,4.6 8.4,2 8.4,20.6 5,18.6',
  '10,1.4 13.4,1.2 13.4,22.4 10,21.8',
  '15,2.6 18.4,5 18.4,19.8 15,21.8',
  '20,7 23.4,9.2 23.4,15 20,17.2',
  '25,7.4 28.4,3.4 28.4,20.6 25,16.6',
] as const;

export const markBox = { width: 28.4, height: 24 } as const;

/** Height of the mark at a width. */
export const markHeight = (width: number): number => (width * markBox.height) / markBox.width;
