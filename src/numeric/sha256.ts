// SHA-256 of bytes, for the fingerprint of a sheet in its record.
//
// Source: FIPS PUB 180-4, sections 4.1.2, 4.2.2, 5.1.1, 5.3.3 and 6.2.2.

/** First 32 bits of the fractional parts of the cube roots of the first 64 primes. */
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
/** First 32 bits of the fractional parts of the square roots of the first 8 primes. */
const START = [0x6a09e667, 0xbb67ae85, 0x3c6ef372, 0xa54ff53a, 0x510e527f, 0x9b05688c, 0x1f83d9ab, 0x5be0cd19];

/** The digest of `bytes` as 64 lower-case hexadecimal digits. */
export function sha256Hex(bytes: Uint8Array): string {
  const state = Uint32Array.from(START);
  const schedule = new Uint32Array(64);
  const padded = pad(bytes);
  for (let block = 0; block < padded.byteLength; block += 64) {
    for (let t = 0; t < 16; t++) schedule[t] = padded.getUint32(block + 4 * t);
    compress(state, schedule);
  }
  return Array.from(state, (word) => word.toString(16).padStart(8, '0')).join('');
}

/** The message, a 1 bit, zeros to a whole block less 8 bytes, and the length in bits. */
function pad(bytes: Uint8Array): DataView {
  const length = (Math.floor((bytes.length + 8) / 64) + 1) * 64;
  const padded = new Uint8Array(length);
  padded.set(bytes);
  padded[bytes.length] = 0x80;
  const view = new DataView(padded.buffer);
  view.setUint32(length - 8, Math.floor(bytes.length / 0x20000000));
  view.setUint32(length - 4, bytes.length << 3);
  return view;
}

function compress(state: Uint32Array, w: Uint32Array): void {
  for (let t = 16; t < 64; t++) {
    const s0 = rotate(w[t - 15], 7) ^ rotate(w[t - 15], 18) ^ (w[t - 15] >>> 3);
    const s1 = rotate(w[t - 2], 17) ^ rotate(w[t - 2], 19) ^ (w[t - 2] >>> 10);
    w[t] = s1 + w[t - 7] + s0 + w[t - 16];
  }
  let [a, b, c, d, e, f, g, h] = state;
  for (let t = 0; t < 64; t++) {
    const sum1 = rotate(e, 6) ^ rotate(e, 11) ^ rotate(e, 25);
    const choice = (e & f) ^ (~e & g);
    const first = (h + sum1 + choice + ROUND_CONSTANTS[t] + w[t]) | 0;
    const sum0 = rotate(a, 2) ^ rotate(a, 13) ^ rotate(a, 22);
    const majority = (a & b) ^ (a & c) ^ (b & c);
    h = g;
    g = f;
    f = e;
    e = (d + first) | 0;
    d = c;
    c = b;
    b = a;
    a = (first + sum0 + majority) | 0;
  }
  state[0] += a;
  state[1] += b;
  state[2] += c;
  state[3] += d;
  state[4] += e;
  state[5] += f;
  state[6] += g;
  state[7] += h;
}

function rotate(word: number, places: number): number {
  return (word >>> places) | (word << (32 - places));
}
