import { ProblemBody } from '#shared/http/problem.ts';
import { photosApi, type UploadedPhoto } from '#shared/photos.ts';
import type { Stage } from '#shared/words/stages.ts';
import { addressOf, CallProblem, NoReception } from '#src/lib/call.ts';

export interface PhotoToSend {
  id: string;
  file: File;
  batchId: string;
  stage: Stage | null;
}

/** Nothing heard for this long: a dead line rather than a slow one, ms. */
const SILENCE_MS = 60_000;

/**
 * Sends one photo and tells how many bytes are out. By XMLHttpRequest: fetch cannot tell.
 *
 * @throws CallProblem for an error answer, NoReception when there was none, AbortError when stopped
 */
export function sendPhoto(photo: PhotoToSend, onSent: (bytes: number) => void, signal: AbortSignal): Promise<UploadedPhoto> {
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest();
    const form = new FormData();
    form.set('batchId', photo.batchId);
    if (photo.stage) form.set('stage', photo.stage);
    form.set('ids', photo.id);
    form.set('photos', photo.file);

    let silence: ReturnType<typeof setTimeout>;
    const heard = () => {
      clearTimeout(silence);
      silence = setTimeout(() => { request.abort(); reject(new NoReception()); }, SILENCE_MS);
    };
    request.upload.addEventListener('progress', ({ loaded }) => { heard(); onSent(loaded); });
    request.addEventListener('error', () => reject(new NoReception()));
    request.addEventListener('abort', () => reject(new DOMException('stopped', 'AbortError')));
    request.addEventListener('load', () => {
      const read = request.status === 200 ? photosApi.upload.reply?.safeParse(jsonOf(request.responseText)) : undefined;
      const item = read?.success ? read.data.items[0] : undefined;
      if (item) resolve(item);
      else reject(new CallProblem(problemOf(request)));
    });
    request.addEventListener('loadend', () => clearTimeout(silence));
    signal.addEventListener('abort', () => request.abort());
    request.open('POST', addressOf(photosApi.upload));
    request.setRequestHeader('Accept', 'application/json');
    heard();
    request.send(form);
  });
}

function jsonOf(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    // A proxy's own page: told as the error it is.
    return undefined;
  }
}

function problemOf(request: XMLHttpRequest): ProblemBody {
  const read = ProblemBody.safeParse(jsonOf(request.responseText));
  return read.success ? read.data : { type: '/problems/unexpected', title: 'Something went wrong on our side', status: request.status || 500 };
}
