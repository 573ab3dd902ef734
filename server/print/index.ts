export { labelsPdf } from './labelsPdf';
export { sheetPdf } from './sheetPdf';
