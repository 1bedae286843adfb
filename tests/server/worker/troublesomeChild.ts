import { serveJobs } from '../../../server/worker/pool/serveJobs';
import { JobFailure } from '../../../server/worker/pool/jobFailure';

/** Jobs of a child that misbehaves on request: what a damaged file may do to a decoder. */
export type TroublesomeJobs = {
  echo: { data: { note: string }; answer: { note: string; lengths: number[]; pid: number } };
  stages: { data: null; answer: null };
  abort: { data: null; answer: null };
  fill: { data: { bytes: number }; answer: null };
  spin: { data: null; answer: null };
  refuse: { data: null; answer: null };
  stumble: { data: null; answer: null };
};

if (process.send) {
  serveJobs<TroublesomeJobs>({
    echo: async (data, files) => ({
      answer: { note: data.note, lengths: files.map((file) => file.length), pid: process.pid },
      blobs: files,
    }),
    stages: async (_data, _files, onStage) => {
      onStage('decode');
      const until = Date.now() + 400;
      while (Date.now() < until);
      onStage('fit');
      return { answer: null };
    },
    abort: async () => process.abort(),
    fill: async ({ bytes }) => {
      const held: Buffer[] = [];
      for (let got = 0; got < bytes; got += 64 * 1024 * 1024) held.push(Buffer.alloc(64 * 1024 * 1024, 1));
      return { answer: null, blobs: held.slice(0, 0) };
    },
    spin: async () => {
      for (;;);
    },
    refuse: async () => {
      throw new JobFailure('unsupported', 'This is a photograph of a cat.');
    },
    stumble: async () => {
      throw new Error('offset 12 lies outside the file');
    },
  });
}
