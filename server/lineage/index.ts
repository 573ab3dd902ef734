export { keepParentage, parentagesOf } from './parentage';
export { pedigreeOf, type RoomPedigree } from './pedigree';
