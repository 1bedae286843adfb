import { createHash } from 'node:crypto';
import { hashSource } from '@/hooks/upload/hashSource';
import { sha256 } from '@/hooks/upload/sha256';
import { memorySource } from './memorySource';

const of = (text: string) => {
  const hash = sha256();
  hash.update(new TextEncoder().encode(text));
  return hash.digest();
};

describe('sha256', () => {
  // NIST, Examples with Intermediate Values for SHA-256 (one block and two block message).
  it('gives the published digests', () => {
    expect(of('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad');
    expect(of('abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq')).toBe(
      '248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1',
    );
  });

  it('agrees with the platform at every length about the block borders, however it is fed', () => {
    for (const length of [0, 1, 55, 56, 57, 63, 64, 65, 119, 120, 127, 128, 129, 1000]) {
      const bytes = Uint8Array.from({ length }, (_, i) => (i * 37 + length) & 255);
      const hash = sha256();
      for (let at = 0; at < length; at += 23) hash.update(bytes.subarray(at, at + 23));
      expect(hash.digest()).toBe(createHash('sha256').update(bytes).digest('hex'));
    }
  });
});

describe('hashSource', () => {
  const bytes = Uint8Array.from({ length: 3 * 1024 * 1024 + 17 }, (_, i) => (i * 31) & 255);
  const expected = createHash('sha256').update(bytes).digest('hex');

  it('hashes in pieces where the page has no secure context, and tells how far it is', async () => {
    const parts: number[] = [];
    const answer = await hashSource(memorySource('frame.tif', bytes), {
      digest: null,
      onProgress: (p) => parts.push(p),
    });
    expect(answer).toBe(expected);
    expect(parts).toHaveLength(4);
    expect(parts.at(-1)).toBe(1);
  });

  it('uses the digest of the browser where there is one', async () => {
    const digest = jest.fn(async (b: Uint8Array) => Uint8Array.from(createHash('sha256').update(b).digest()).buffer);
    expect(await hashSource(memorySource('frame.tif', bytes), { digest })).toBe(expected);
    expect(digest).toHaveBeenCalledTimes(1);
  });

  it('stops when it is cancelled', async () => {
    const controller = new AbortController();
    const answer = hashSource(memorySource('frame.tif', bytes), {
      digest: null,
      signal: controller.signal,
      onProgress: () => controller.abort(new Error('cancelled')),
    });
    await expect(answer).rejects.toThrow('cancelled');
  });
});
