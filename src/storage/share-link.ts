// A sheet in the fragment of an address, and back.
//
//     sheet-1.COUNT.BODY.DIGEST
//
// 1 is the version of this form, BODY the UTF-8 text packed by deflate and written in base64url, COUNT how many
// characters BODY has, DIGEST the first 12 hexadecimal digits of the SHA-256 of the UTF-8 text. COUNT tells a link that
// was cut short, and by how much; DIGEST makes sure that no other text is ever opened than the one that was shared.
// The digest stands last because programs that find links in mail leave out a `-` or `_` at the end of one. Blanks,
// line ends and `=` that mail has put between the characters are passed over, and so is what hangs behind the digest.

import { fromBase64url, toBase64url } from './base64url.ts';
import { canDeflate, deflate, inflate } from './deflate.ts';
import { linkFault } from './link-sentences.ts';
import type { StorageFault } from './sentences.ts';

/** Characters of a fragment: longer ones do not come through mail and chat, though a browser would open them. */
export const LINK_LIMIT = 100_000;
/** Bytes of UTF-8 in the text of a sheet that comes from outside. */
export const TEXT_LIMIT = 2 * 1024 * 1024;

/** SHA-256 of bytes as 64 hexadecimal digits. */
type Sha256Hex = (bytes: Uint8Array) => string;

export type Written = { readonly fragment: string } | { readonly fault: StorageFault };
type Read = { readonly text: string } | { readonly fault: StorageFault };

const MARK = 'sheet-';
const VERSION = 1;
const DIGEST_LENGTH = 12;
/** As much of the header as there is. */
const HEADER = /^sheet-(\d+)(?:(\.)(\d*)(\.)?)?/;

/** The fragment for a text, without `#`. Half a surrogate pair, which has no UTF-8, becomes U+FFFD. */
export async function writeLink(text: string, sha256Hex: Sha256Hex): Promise<Written> {
  if (!canDeflate()) return { fault: linkFault.cannotPack() };
  const bytes = new TextEncoder().encode(text);
  if (bytes.length > TEXT_LIMIT) return { fault: linkFault.tooLargeToWrite(bytes.length, TEXT_LIMIT) };
  const body = toBase64url(await deflate(bytes));
  const fragment = `${MARK}${VERSION}.${body.length}.${body}.${digestOf(bytes, sha256Hex)}`;
  if (fragment.length > LINK_LIMIT) return { fault: linkFault.tooLong(fragment.length, LINK_LIMIT) };
  return { fragment };
}

/** The text in a fragment, with or without `#`; null where the fragment is empty. */
export async function readLink(fragment: string, sha256Hex: Sha256Hex): Promise<Read | null> {
  const arrived = fragment.replace(/^#/, '').replace(/%(?:20|09|0A|0D|3D)|[\s=]/gi, '');
  if (arrived === '') return null;
  if (MARK.startsWith(arrived)) return { fault: linkFault.cut(arrived.length, null) };
  const [start, version, versionEnd, count, countEnd] = HEADER.exec(arrived) ?? [''];
  if (!version) return { fault: linkFault.foreign() };
  if (versionEnd && Number(version) > VERSION) return { fault: linkFault.newer() };
  if (start === arrived && !countEnd) return { fault: linkFault.cut(arrived.length, null) };
  const isCount = /^(?:0|[1-9]\d*)$/.test(count ?? '') && Number(count) <= LINK_LIMIT;
  if (version !== String(VERSION) || !countEnd || !isCount) return { fault: linkFault.damaged() };
  return readBody(arrived, start.length, Number(count), sha256Hex);
}

async function readBody(arrived: string, from: number, count: number, sha256Hex: Sha256Hex): Promise<Read> {
  const to = from + count;
  const total = to + 1 + DIGEST_LENGTH;
  if (arrived.length < total) return { fault: linkFault.cut(arrived.length, total) };
  const digest = arrived.slice(to + 1, total);
  const packed = fromBase64url(arrived.slice(from, to));
  if (arrived[to] !== '.' || !packed) return { fault: linkFault.damaged() };
  if (!canDeflate()) return { fault: linkFault.cannotUnpack() };
  const inflated = await inflate(packed, TEXT_LIMIT);
  if (inflated.status === 'too large') return { fault: linkFault.tooLarge(TEXT_LIMIT) };
  if (inflated.status !== 'whole' || digestOf(inflated.bytes, sha256Hex) !== digest) {
    return { fault: linkFault.damaged() };
  }
  try {
    // A byte order mark is part of the text here: what was shared comes back unchanged.
    return { text: new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(inflated.bytes) };
  } catch {
    return { fault: linkFault.damaged() };
  }
}

function digestOf(bytes: Uint8Array, sha256Hex: Sha256Hex): string {
  return sha256Hex(bytes).slice(0, DIGEST_LENGTH);
}
