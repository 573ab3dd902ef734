export { keepParentage, parentagesOf } from './parentage';
