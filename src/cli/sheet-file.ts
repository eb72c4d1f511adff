// Reading a sheet text from a file or from standard input.

/** The text without a byte order mark, or a sentence that says why there is none. */
type SheetFile = { readonly text: string } | { readonly fault: string };

/** Reads all bytes with `read` and takes them as UTF-8; `name` is what the sentences call the file. */
export function readSheetFile(name: string, read: () => Uint8Array): SheetFile {
  let bytes: Uint8Array;
  try {
    bytes = read();
  } catch (thrown) {
    return { fault: reason(name, thrown) };
  }
  try {
    return { text: new TextDecoder('utf-8', { fatal: true }).decode(bytes) };
  } catch {
    return { fault: `${name} is not UTF-8 text. Save it as UTF-8 and try again.` };
  }
}

function reason(name: string, thrown: unknown): string {
  const code = thrown instanceof Error && 'code' in thrown ? String(thrown.code) : '';
  switch (code) {
    case 'ENOENT':
    case 'ENOTDIR':
      return `There is no file ${name}.`;
    case 'EISDIR':
      return `${name} is a directory, not a sheet file.`;
    case 'EACCES':
    case 'EPERM':
      return `${name} may not be read: permission is denied.`;
    default:
      if (code === '') throw thrown;
      return `${name} cannot be read (${code}).`;
  }
}
