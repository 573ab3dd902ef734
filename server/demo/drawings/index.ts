export type { Description, FishDescription, TrayDescription } from './description';
export { draw, svgOf } from './draw';
export { jpegOf, type Orientation } from './jpeg';
export { DRAWN, type DrawnSpecies } from './species';
