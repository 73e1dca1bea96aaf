import type { Problem } from '@/domain/api/schemas/common';
import type { UploadedPhoto } from '@/domain/api/schemas/photos';
import { Refused } from './ask';

/** A photo on its way. */
export interface Sending {
  /** Rejects with `Refused` where the server said no; with another error where there was no answer. */
  done: Promise<UploadedPhoto>;
  abort: () => void;
}

/**
 * Uploads a photo. `fetch` does not tell how far an upload has come, so this is done the older way.
 *
 * @param key the same for a second try of the same photo, which is then kept once
 * @param onShare of the bytes that have gone out, 0 to 1
 */
export function sendPhoto(file: File, key: string, onShare: (share: number) => void): Sending {
  const request = new XMLHttpRequest();
  const done = new Promise<UploadedPhoto>((resolve, reject) => {
    request.open('POST', '/api/v1/photos');
    request.setRequestHeader('accept', 'application/json');
    request.setRequestHeader('idempotency-key', key);
    request.responseType = 'json';
    request.upload.onprogress = ({ loaded, total }) => onShare(total > 0 ? loaded / total : 0);
    request.onload = () => {
      const { status, response } = request as { status: number; response: unknown };
      if (status === 201 && response) resolve(response as UploadedPhoto);
      else reject(new Refused(status, (response as Problem | null) ?? noAnswer(status)));
    };
    request.onerror = () => reject(new Error('There was no answer.'));
    request.onabort = () => reject(new Error('It was taken off.'));
    const form = new FormData();
    form.append('photo', file);
    request.send(form);
  });
  return { done, abort: () => request.abort() };
}

const noAnswer = (status: number): Problem => ({
  type: 'about:blank',
  title: 'No answer',
  status,
  detail: `The server answered ${status}. Try again in a moment.`,
});
