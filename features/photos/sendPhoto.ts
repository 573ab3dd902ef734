import { addressOf, refusalOf, Unreachable } from '@/features/call';
import { addPhoto } from '@/shared/photos/contract';
import type { EntryDraft } from '@/shared/record/contract';

/** Sends one picture with its entry. A request of the older kind, since fetch does not tell how far an upload is. */
export function sendPhoto(
  roomId: string,
  draft: EntryDraft,
  picture: File,
  onShare: (share: number) => void,
): Promise<void> {
  const form = new FormData();
  form.append('entry', JSON.stringify(draft));
  form.append('picture', picture);
  return new Promise((done, failed) => {
    const request = new XMLHttpRequest();
    request.open('POST', addressOf(addPhoto, { params: { roomId } }));
    request.upload.onprogress = ({ loaded, total }) => onShare(total > 0 ? loaded / total : 0);
    request.onerror = () => failed(new Unreachable('No signal. The photo is still here: send it again.'));
    request.onload = () => {
      if (request.status >= 200 && request.status < 300) return done();
      const json = async (): Promise<unknown> => JSON.parse(request.responseText);
      refusalOf({ status: request.status, json }).then(failed, failed);
    };
    request.send(form);
  });
}
