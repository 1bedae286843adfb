import { accessToken, ownRequest, renewAccessToken } from '@/hooks/api/accessToken';
import { problemFrom } from '@/hooks/api/ApiProblem';
import { urlOf } from '@/hooks/api/urlOf';
import { captureEndpoints, type FrameKind } from '@/shared/contracts/captures';
import type { FrameSource } from './frameSource';
import { problemOf } from './problemOf';
import { UploadProblem } from './uploadProblem';

/** No byte for so long means that the line is dead, ms. */
const STALLED_MS = 30_000;
/** The server hashes and stores what has come in before it answers; it may take its time over a large file, ms. */
const ANSWER_MS = 120_000;
const NO_NETWORK = 'No network.';

export interface SentFile {
  captureId: string;
  source: FrameSource;
  name: string;
  kind: FrameKind;
  sha256: string;
}
interface SendOptions {
  signal: AbortSignal;
  onProgress: (sentBytes: number) => void;
}

/** One attempt; answers with status and text. `fetch` cannot tell how much has gone out, so this is XMLHttpRequest. */
function post(
  file: SentFile,
  token: string,
  { signal, onProgress }: SendOptions,
): Promise<{ status: number; text: string }> {
  return new Promise((resolve, reject) => {
    const endpoint = captureEndpoints.upload;
    const request = new XMLHttpRequest();
    let watch: ReturnType<typeof setTimeout>;
    const watchFor = (ms: number) => {
      clearTimeout(watch);
      watch = setTimeout(() => {
        request.abort();
        reject(new UploadProblem('network', NO_NETWORK));
      }, ms);
    };
    const stop = () => {
      request.abort();
      reject(signal.reason as Error);
    };
    const end = (settle: () => void) => () => {
      clearTimeout(watch);
      signal.removeEventListener('abort', stop);
      settle();
    };
    signal.addEventListener('abort', stop);
    request.upload.onprogress = (event) => {
      watchFor(STALLED_MS);
      // The envelope of the form counts as well; a file is never said to be more than whole.
      onProgress(event.total > 0 ? (event.loaded / event.total) * file.source.sizeBytes : event.loaded);
    };
    request.upload.onload = () => watchFor(ANSWER_MS);
    request.onload = end(() => resolve({ status: request.status, text: request.responseText }));
    request.onerror = end(() => reject(new UploadProblem('network', NO_NETWORK)));
    request.onabort = end(() =>
      reject(signal.aborted ? (signal.reason as Error) : new UploadProblem('network', NO_NETWORK)),
    );
    request.open(endpoint.method.toUpperCase(), urlOf(endpoint, { params: { captureId: file.captureId } }));
    request.setRequestHeader('Authorization', `Bearer ${token}`);
    Object.entries(ownRequest).forEach(([name, value]) => request.setRequestHeader(name, value));
    const form = new FormData();
    form.append('kind', file.kind);
    form.append('sha256', file.sha256);
    form.append('file', file.source.part, file.name);
    watchFor(STALLED_MS);
    request.send(form);
  });
}

/**
 * Sends one file to a capture.
 * @throws UploadProblem, or the signal's reason when it is cancelled.
 */
export async function sendFile(file: SentFile, options: SendOptions): Promise<void> {
  try {
    let answer = await post(file, await accessToken(), options);
    if (answer.status === 401) {
      const session = await renewAccessToken();
      if (session !== null) answer = await post(file, session.accessToken, options);
    }
    if (answer.status >= 400) throw problemFrom(answer.status, answer.text);
  } catch (cause) {
    if (options.signal.aborted) throw cause;
    throw problemOf(cause);
  }
}
