/** Opens the browser's own chooser; hands on the one file that was chosen. */
export function chooseFile(accept: string, take: (file: File) => void): void {
  const chooser = document.createElement('input');
  chooser.type = 'file';
  chooser.accept = accept;
  chooser.onchange = () => {
    const file = chooser.files?.[0];
    if (file) take(file);
  };
  chooser.click();
}

/** Saves what an address answers as a file, by the browser's own means. */
export function saveFrom(address: string): void {
  const link = document.createElement('a');
  link.href = address;
  link.download = '';
  document.body.append(link);
  link.click();
  link.remove();
}
