import { openPictures } from '../../server/pictures';

/** Run as a process of its own: stores one picture and, at the named point, dies as if the plug had been pulled. */
async function main(): Promise<void> {
  const [folder = '', file = '', roomId = '', id = '', crashAt = ''] = process.argv.slice(2);
  const pictures = await openPictures({ folder, maxBytes: 1_000_000, crashAt });
  process.stdout.write('storing\n');
  const { sha256 } = await pictures.store(file, roomId, id);
  process.stdout.write(`${sha256}\n`);
}

void main();
