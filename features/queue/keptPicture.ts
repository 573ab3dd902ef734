import type { KeptPicture } from './waiting';

/** The bytes of a picture that was chosen: the file itself is gone when the page is. */
export async function keptPicture(file: File): Promise<KeptPicture> {
  return { name: file.name, type: file.type, bytes: await file.arrayBuffer() };
}
