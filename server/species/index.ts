export { figuresOf, profileIn, valuesOf } from './figures';
export { speciesNames } from './names';
