import { type ReceiptContent, receiptPages } from '../../shared/orders/receipt';
import type { Paper } from '../../shared/print/page';
import { pdfOf } from './pdf';

/** A receipt as a PDF for A4 or Letter. */
export async function receiptPdf(content: ReceiptContent, buyerName: string, paper: Paper): Promise<Buffer> {
  const info = {
    title: `Receipt for order ${content.number}`,
    author: content.roomName,
    subject: `Order ${content.number}`,
    madeOn: new Date(`${content.issuedOn}T12:00:00Z`),
  };
  return pdfOf(receiptPages(content, buyerName, paper), info);
}
