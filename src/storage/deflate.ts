// Raw deflate streams through the browser's own compressor. Source: RFC 1951.

/** What came of unpacking; `damaged` is also a stream that ends too early. Bytes behind its end are damage in some browsers only. */
type Inflated = { readonly status: 'whole'; readonly bytes: Uint8Array } | { readonly status: 'damaged' | 'too large' };

/** Whether this browser has the compressor. */
export function canDeflate(): boolean {
  try {
    return Boolean(new CompressionStream('deflate-raw'));
  } catch {
    return false;
  }
}

/** Packs bytes. */
export async function deflate(bytes: Uint8Array<ArrayBuffer>): Promise<Uint8Array> {
  const packed = await collect(new Blob([bytes]).stream().pipeThrough(new CompressionStream('deflate-raw')), Infinity);
  if (!packed) throw new Error('a stream without limit passed it');
  return packed;
}

/** Unpacks bytes up to `limit`: a small stream may stand for a very large text, of which no more than that is made. */
export async function inflate(packed: Uint8Array<ArrayBuffer>, limit: number): Promise<Inflated> {
  try {
    const stream = new Blob([packed]).stream().pipeThrough(new DecompressionStream('deflate-raw'));
    const bytes = await collect(stream, limit);
    return bytes ? { status: 'whole', bytes } : { status: 'too large' };
  } catch {
    return { status: 'damaged' };
  }
}

async function collect(stream: ReadableStream<Uint8Array>, limit: number): Promise<Uint8Array | null> {
  const reader = stream.getReader();
  const parts: Uint8Array[] = [];
  let length = 0;
  for (;;) {
    const { done, value } = await reader.read();
    if (done) break;
    length += value.length;
    if (length > limit) {
      await reader.cancel();
      return null;
    }
    parts.push(value);
  }
  const bytes = new Uint8Array(length);
  let at = 0;
  for (const part of parts) {
    bytes.set(part, at);
    at += part.length;
  }
  return bytes;
}
