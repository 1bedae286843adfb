/** An SHA-256 that is fed piece by piece. */
export interface Sha256 {
  update(bytes: Uint8Array): void;
  /** 64 lower-case hexadecimal digits. The hash cannot be fed afterwards. */
  digest(): string;
}

/** First 32 bits of the fractional parts of the cube roots of the first 64 primes: FIPS 180-4, section 4.2.2. */
const ROUND = Uint32Array.of(
  0x428a2f98,
  0x71374491,
  0xb5c0fbcf,
  0xe9b5dba5,
  0x3956c25b,
  0x59f111f1,
  0x923f82a4,
  0xab1c5ed5,
  0xd807aa98,
  0x12835b01,
  0x243185be,
  0x550c7dc3,
  0x72be5d74,
  0x80deb1fe,
  0x9bdc06a7,
  0xc19bf174,
  0xe49b69c1,
  0xefbe4786,
  0x0fc19dc6,
  0x240ca1cc,
  0x2de92c6f,
  0x4a7484aa,
  0x5cb0a9dc,
  0x76f988da,
  0x983e5152,
  0xa831c66d,
  0xb00327c8,
  0xbf597fc7,
  0xc6e00bf3,
  0xd5a79147,
  0x06ca6351,
  0x14292967,
  0x27b70a85,
  0x2e1b2138,
  0x4d2c6dfc,
  0x53380d13,
  0x650a7354,
  0x766a0abb,
  0x81c2c92e,
  0x92722c85,
  0xa2bfe8a1,
  0xa81a664b,
  0xc24b8b70,
  0xc76c51a3,
  0xd192e819,
  0xd6990624,
  0xf40e3585,
  0x106aa070,
  0x19a4c116,
  0x1e376c08,
  0x2748774c,
  0x34b0bcb5,
  0x391c0cb3,
  0x4ed8aa4a,
  0x5b9cca4f,
  0x682e6ff3,
  0x748f82ee,
  0x78a5636f,
  0x84c87814,
  0x8cc70208,
  0x90befffa,
  0xa4506ceb,
  0xbef9a3f7,
  0xc67178f2,
);

/** Square roots of the first eight primes: FIPS 180-4, section 5.3.3. */
const START = [0x6a09e667, 0xbb67ae85, 0x3c6ef372, 0xa54ff53a, 0x510e527f, 0x9b05688c, 0x1f83d9ab, 0x5be0cd19];

const BLOCK_BYTES = 64;

function compress(state: Uint32Array, schedule: Uint32Array, bytes: Uint8Array, offset: number): void {
  for (let i = 0; i < 16; i++) {
    const p = offset + i * 4;
    schedule[i] = (bytes[p]! << 24) | (bytes[p + 1]! << 16) | (bytes[p + 2]! << 8) | bytes[p + 3]!;
  }
  for (let i = 16; i < 64; i++) {
    const a = schedule[i - 15]!;
    const b = schedule[i - 2]!;
    const s0 = ((a >>> 7) | (a << 25)) ^ ((a >>> 18) | (a << 14)) ^ (a >>> 3);
    const s1 = ((b >>> 17) | (b << 15)) ^ ((b >>> 19) | (b << 13)) ^ (b >>> 10);
    schedule[i] = (schedule[i - 16]! + s0 + schedule[i - 7]! + s1) | 0;
  }
  let a = state[0]!;
  let b = state[1]!;
  let c = state[2]!;
  let d = state[3]!;
  let e = state[4]!;
  let f = state[5]!;
  let g = state[6]!;
  let h = state[7]!;
  for (let i = 0; i < 64; i++) {
    const s1 = ((e >>> 6) | (e << 26)) ^ ((e >>> 11) | (e << 21)) ^ ((e >>> 25) | (e << 7));
    const t1 = (h + s1 + ((e & f) ^ (~e & g)) + ROUND[i]! + schedule[i]!) | 0;
    const s0 = ((a >>> 2) | (a << 30)) ^ ((a >>> 13) | (a << 19)) ^ ((a >>> 22) | (a << 10));
    const t2 = (s0 + ((a & b) ^ (a & c) ^ (b & c))) | 0;
    h = g;
    g = f;
    f = e;
    e = (d + t1) | 0;
    d = c;
    c = b;
    b = a;
    a = (t1 + t2) | 0;
  }
  [a, b, c, d, e, f, g, h].forEach((word, i) => {
    state[i] = (state[i]! + word) | 0;
  });
}

/**
 * SHA-256 as FIPS 180-4 gives it, for places where the browser's own is not to be had (a page that did not come over a
 * secure context) and for files too large to hold at once. Files up to 2^53 bytes.
 */
export function sha256(): Sha256 {
  const state = Uint32Array.from(START);
  const schedule = new Uint32Array(64);
  const rest = new Uint8Array(BLOCK_BYTES);
  let restLength = 0;
  let byteCount = 0;

  function update(bytes: Uint8Array): void {
    byteCount += bytes.length;
    let position = 0;
    if (restLength > 0) {
      position = Math.min(BLOCK_BYTES - restLength, bytes.length);
      rest.set(bytes.subarray(0, position), restLength);
      restLength += position;
      if (restLength < BLOCK_BYTES) return;
      compress(state, schedule, rest, 0);
      restLength = 0;
    }
    for (; position + BLOCK_BYTES <= bytes.length; position += BLOCK_BYTES) {
      compress(state, schedule, bytes, position);
    }
    rest.set(bytes.subarray(position), 0);
    restLength = bytes.length - position;
  }

  function digest(): string {
    const bitCount = byteCount * 8;
    const padding = new Uint8Array(restLength < 56 ? BLOCK_BYTES - restLength : 2 * BLOCK_BYTES - restLength);
    padding[0] = 0x80;
    const view = new DataView(padding.buffer);
    view.setUint32(padding.length - 8, Math.floor(bitCount / 2 ** 32));
    view.setUint32(padding.length - 4, bitCount >>> 0);
    update(padding);
    return Array.from(state, (word) => word.toString(16).padStart(8, '0')).join('');
  }

  return { update, digest };
}
