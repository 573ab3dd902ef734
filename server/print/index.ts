export { labelsPdf } from './labelsPdf';
export { receiptPdf } from './receiptPdf';
export { sheetPdf } from './sheetPdf';
