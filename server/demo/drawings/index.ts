export type { Description, Drawing, FishDescription, TrayDescription } from './description';
export { draw, svgOf } from './draw';
export { type Capture, jpegOf, type Orientation } from './jpeg';
export { DRAWN, type DrawnSpecies } from './species';
