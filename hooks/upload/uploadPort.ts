import { call } from '@/hooks/api/call';
import { captureEndpoints } from '@/shared/contracts/captures';
import { problemOf } from './problemOf';
import { sendFile } from './sendFile';
import type { UploadPort } from './uploadQueue';

/** The most files that are asked about in one request, by the contract. */
const ASKED_AT_ONCE = 1000;

/** The laboratory behind the API, for the uploads of one capture. */
export function uploadPort(captureId: string): UploadPort {
  const params = { captureId };
  return {
    async placeKnown(files) {
      try {
        const missing: string[] = [];
        for (let start = 0; start < files.length; start += ASKED_AT_ONCE) {
          const body = { files: files.slice(start, start + ASKED_AT_ONCE) };
          missing.push(...(await call(captureEndpoints.placeKnown, { params, body })).missing);
        }
        return missing;
      } catch (cause) {
        throw problemOf(cause);
      }
    },
    send: (file, options) => sendFile({ captureId, ...file }, options),
    async measure() {
      try {
        await call(captureEndpoints.measureCapture, { params, body: {} });
      } catch (cause) {
        throw problemOf(cause);
      }
    },
  };
}
