import sharp from 'sharp';

/** Every picture is read from a file; readers of buffers and of all other formats stay shut. */
const MAY_READ = [
  'VipsForeignLoadJpegFile',
  'VipsForeignLoadPngFile',
  'VipsForeignLoadWebpFile',
  // AVIF. HEIC shares its container, but the codec is not in the build.
  'VipsForeignLoadHeifFile',
];

/** What the server's own drawings need. They lie in memory, so opening these readers lets no uploaded file in. */
const FOR_DRAWING = ['VipsForeignLoadSvgBuffer', 'VipsForeignLoadPngBuffer'];
let drawing = 0;

/** Holds for the whole process: after this, sharp reads no SVG, GIF, TIFF or PDF anywhere in the server. */
export function limitDecoders(): void {
  sharp.block({ operation: ['VipsForeignLoad'] });
  sharp.unblock({ operation: drawing > 0 ? [...MAY_READ, ...FOR_DRAWING] : MAY_READ });
  sharp.cache(false);
  // One thread a picture: two pictures at once fill a small machine, and the rest of the server must breathe.
  sharp.concurrency(1);
}

/** Lets sharp paint SVG that the server itself wrote, as long as `work` runs. */
export async function whileDrawing<T>(work: () => Promise<T>): Promise<T> {
  drawing += 1;
  limitDecoders();
  try {
    return await work();
  } finally {
    drawing -= 1;
    limitDecoders();
  }
}
