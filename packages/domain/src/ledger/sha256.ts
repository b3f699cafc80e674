/** First 32 bits of the fractional parts of the cube roots of the first 64 primes (FIPS 180-4, 4.2.2). */
const ROUND_CONSTANTS = Uint32Array.of(
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

/** First 32 bits of the fractional parts of the square roots of the first eight primes (FIPS 180-4, 5.3.3). */
const INITIAL_STATE = [
  0x6a09e667, 0xbb67ae85, 0x3c6ef372, 0xa54ff53a, 0x510e527f, 0x9b05688c, 0x1f83d9ab, 0x5be0cd19,
] as const;

const BLOCK_BYTES = 64;

/** A hash of bytes; passed in, so that a faster one can serve where there is one. */
export type HashFunction = (bytes: Uint8Array) => Uint8Array;

/**
 * SHA-256 of bytes, without IO and at once: for the browser and for tests. Where Node's own crypto is at hand, pass
 * that to the ledger functions instead; it is many times faster.
 * @param bytes any length below 2^53 bits
 * @returns 32 bytes
 * Source: FIPS 180-4, 6.2. Example: SHA-256 of the three bytes `abc` begins with ba 78 16 bf.
 */
export function sha256(bytes: Uint8Array): Uint8Array {
  const state = Uint32Array.from(INITIAL_STATE);
  const schedule = new Uint32Array(BLOCK_BYTES);
  const input = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const whole = bytes.length - (bytes.length % BLOCK_BYTES);
  for (let at = 0; at < whole; at += BLOCK_BYTES) compress(state, schedule, input, at);
  const tail = padded(bytes, whole);
  for (let at = 0; at < tail.byteLength; at += BLOCK_BYTES) compress(state, schedule, tail, at);
  const digest = new DataView(new ArrayBuffer(32));
  for (let i = 0; i < 8; i++) digest.setUint32(4 * i, state[i]!);
  return new Uint8Array(digest.buffer);
}

/** The last, unfilled block with its padding: 0x80, zeros, length in bits (FIPS 180-4, 5.1.1). */
function padded(bytes: Uint8Array, whole: number): DataView {
  const rest = bytes.length - whole;
  const tail = new Uint8Array(rest + 9 > BLOCK_BYTES ? 2 * BLOCK_BYTES : BLOCK_BYTES);
  tail.set(bytes.subarray(whole));
  tail[rest] = 0x80;
  const view = new DataView(tail.buffer);
  view.setUint32(tail.length - 8, Math.floor(bytes.length / 0x20000000));
  view.setUint32(tail.length - 4, (bytes.length * 8) % 0x100000000);
  return view;
}

/** One block (FIPS 180-4, 6.2.2). Writes `state` and `w`. */
function compress(state: Uint32Array, w: Uint32Array, block: DataView, at: number): void {
  for (let t = 0; t < 16; t++) w[t] = block.getUint32(at + 4 * t);
  for (let t = 16; t < 64; t++) {
    const x = w[t - 15]!;
    const y = w[t - 2]!;
    const small0 = rotated(x, 7) ^ rotated(x, 18) ^ (x >>> 3);
    const small1 = rotated(y, 17) ^ rotated(y, 19) ^ (y >>> 10);
    w[t] = small1 + w[t - 7]! + small0 + w[t - 16]!;
  }
  let [a, b, c, d, e, f, g, h] = [
    state[0]!,
    state[1]!,
    state[2]!,
    state[3]!,
    state[4]!,
    state[5]!,
    state[6]!,
    state[7]!,
  ];
  for (let t = 0; t < 64; t++) {
    const big1 = rotated(e, 6) ^ rotated(e, 11) ^ rotated(e, 25);
    const t1 = (h + big1 + ((e & f) ^ (~e & g)) + ROUND_CONSTANTS[t]! + w[t]!) | 0;
    const big0 = rotated(a, 2) ^ rotated(a, 13) ^ rotated(a, 22);
    const t2 = (big0 + ((a & b) ^ (a & c) ^ (b & c))) | 0;
    h = g;
    g = f;
    f = e;
    e = (d + t1) | 0;
    d = c;
    c = b;
    b = a;
    a = (t1 + t2) | 0;
  }
  const after = [a, b, c, d, e, f, g, h];
  for (let i = 0; i < 8; i++) state[i] = state[i]! + after[i]!;
}

function rotated(word: number, bits: number): number {
  return (word >>> bits) | (word << (32 - bits));
}
