export { speciesNames } from './names';
