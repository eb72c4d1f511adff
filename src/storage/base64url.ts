// Bytes as characters that pass through an address unchanged. Source: RFC 4648, section 5, without padding.

/** At most so many arguments are given to a function at once. */
const CHUNK = 8192;

/** Writes bytes with `A-Z a-z 0-9 - _`, four characters for three bytes. */
export function toBase64url(bytes: Uint8Array): string {
  let binary = '';
  for (let at = 0; at < bytes.length; at += CHUNK) binary += String.fromCharCode(...bytes.subarray(at, at + CHUNK));
  return btoa(binary).replaceAll('+', '-').replaceAll('/', '_').replace(/=+$/, '');
}

/** The bytes, or null where the text is not what `toBase64url` writes. */
export function fromBase64url(text: string): Uint8Array<ArrayBuffer> | null {
  if (!/^[\w-]*$/.test(text) || text.length % 4 === 1) return null;
  const binary = atob(text.replaceAll('-', '+').replaceAll('_', '/'));
  const bytes = Uint8Array.from(binary, (character) => character.charCodeAt(0));
  // Bits behind the last whole byte must be zero, else two texts would stand for the same bytes.
  return toBase64url(bytes) === text ? bytes : null;
}
