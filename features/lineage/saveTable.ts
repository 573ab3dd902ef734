/** Hands the table to the browser as a file. */
export function saveTable(text: string): void {
  const address = URL.createObjectURL(new Blob([text], { type: 'text/csv' }));
  const link = document.createElement('a');
  link.href = address;
  link.download = 'pedigree.csv';
  link.click();
  URL.revokeObjectURL(address);
}
