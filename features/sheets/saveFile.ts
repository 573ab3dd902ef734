import { sheetFile, sheetFileName } from '@/shared/sheets/sheetFile';

/** Hands the signed sheet to the browser as a small file, to be sent along or kept. */
export function saveSheetFile(number: string, { jws, keysAt }: { jws: string; keysAt: string }): void {
  const blob = new Blob([JSON.stringify(sheetFile(jws, keysAt))], { type: 'application/json' });
  const address = URL.createObjectURL(blob);
  const link = document.createElement('a');
  link.href = address;
  link.download = sheetFileName(number);
  link.click();
  URL.revokeObjectURL(address);
}
