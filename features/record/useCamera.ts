import { type RefObject, useEffect, useEffectEvent, useState } from 'react';

export type CameraState = 'asking' | 'looking' | 'refused' | 'none';

/** Looks ten times a second are enough for a hand that holds still, and leave the phone cool. */
const LOOK_EVERY_MS = 100;
/** A code that fills a third of the picture is still read at this width. */
const LOOK_WIDTH = 640;

/** The phone's back camera in a video element, read for square codes while the page is open. */
export function useCamera(video: RefObject<HTMLVideoElement | null>, onRead: (text: string) => void): CameraState {
  const [state, setState] = useState<CameraState>('asking');
  const read = useEffectEvent(onRead);
  useEffect(() => {
    let stopped = false;
    let stream: MediaStream | null = null;
    let timer: ReturnType<typeof setTimeout> | undefined;
    const begin = async () => {
      if (!navigator.mediaDevices?.getUserMedia) return setState('none');
      try {
        stream = await navigator.mediaDevices.getUserMedia({ video: { facingMode: 'environment' }, audio: false });
      } catch (error) {
        return setState(error instanceof DOMException && error.name === 'NotAllowedError' ? 'refused' : 'none');
      }
      const element = video.current;
      if (stopped || !element) return stopAll(stream);
      element.srcObject = stream;
      await element.play().catch(() => {});
      setState('looking');
      // The reader is only fetched where there is a camera to read from.
      const { default: readCode } = await import('jsqr');
      const look = () => {
        if (stopped) return;
        const picture = pictureOf(element);
        const found = picture ? readCode(picture.data, picture.width, picture.height) : null;
        if (found?.data) read(found.data);
        timer = setTimeout(look, LOOK_EVERY_MS);
      };
      look();
    };
    void begin();
    return () => {
      stopped = true;
      clearTimeout(timer);
      stopAll(stream);
    };
  }, [video]);
  return state;
}

const stopAll = (stream: MediaStream | null): void => {
  for (const track of stream?.getTracks() ?? []) track.stop();
};

function pictureOf(video: HTMLVideoElement): ImageData | null {
  if (video.videoWidth === 0) return null;
  const width = Math.min(LOOK_WIDTH, video.videoWidth);
  const height = Math.round((video.videoHeight * width) / video.videoWidth);
  const canvas = document.createElement('canvas');
  canvas.width = width;
  canvas.height = height;
  const context = canvas.getContext('2d', { willReadFrequently: true });
  context?.drawImage(video, 0, 0, width, height);
  return context?.getImageData(0, 0, width, height) ?? null;
}
