import sharp from 'sharp';

/** Every picture is read from a file; readers of buffers and of all other formats stay shut. */
const MAY_READ = [
  'VipsForeignLoadJpegFile',
  'VipsForeignLoadPngFile',
  'VipsForeignLoadWebpFile',
  // AVIF. HEIC shares its container, but the codec is not in the build.
  'VipsForeignLoadHeifFile',
];

/** Holds for the whole process: after this, sharp reads no SVG, GIF, TIFF or PDF anywhere in the server. */
export function limitDecoders(): void {
  sharp.block({ operation: ['VipsForeignLoad'] });
  sharp.unblock({ operation: MAY_READ });
  sharp.cache(false);
  // One thread a picture: two pictures at once fill a small machine, and the rest of the server must breathe.
  sharp.concurrency(1);
}
