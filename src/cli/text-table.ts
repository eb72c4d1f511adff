// Columns of text, aligned by characters. What is too long for its column is wrapped, or cut with a mark.

/** Between two columns. */
const GAP = '  ';
const CUT = '…';
/** Where a line may be broken: not between a number and its unit. */
const BREAK = /(?<!\d) | (?![\p{L}%°/])/u;

export interface Column {
  /** In characters. */
  readonly width: number;
  /** What is too long goes on in further lines, up to so many; the last of them ends in a mark where more would follow. */
  readonly mostLines: number;
}

/** How many characters a text takes: code points, since neither numbers nor names hold combining ones. */
export function characterCount(text: string): number {
  let count = 0;
  for (const _ of text) count++;
  return count;
}

/** One row of cells as lines of text; the last column is not padded. */
export function rowLines(cells: readonly string[], columns: readonly Column[]): string[] {
  const wrapped = columns.map(({ width, mostLines }, i) => {
    const lines = wrapText(cells[i] ?? '', width);
    return lines.length <= mostLines
      ? lines
      : [...lines.slice(0, mostLines - 1), cutText(lines.slice(mostLines - 1).join(' '), width)];
  });
  const height = Math.max(...wrapped.map((lines) => lines.length));
  const rows: string[] = [];
  for (let i = 0; i < height; i++) {
    rows.push(
      columns
        .map(({ width }, column) => pad(wrapped[column]![i] ?? '', width))
        .join(GAP)
        .trimEnd(),
    );
  }
  return rows;
}

/** The width left for a last column behind the others. */
export function widthLeft(total: number, others: readonly number[]): number {
  return total - others.reduce((sum, width) => sum + width + GAP.length, 0);
}

/** Lines of at most `width` characters, broken at blanks and, where a word is longer, inside of it; at least one line. */
export function wrapText(text: string, width: number): string[] {
  if (characterCount(text) <= width) return [text];
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(BREAK)) {
    const longer = line === '' ? word : `${line} ${word}`;
    if (characterCount(longer) <= width) {
      line = longer;
      continue;
    }
    if (line !== '') lines.push(line);
    const characters = [...word];
    while (characters.length > width) lines.push(characters.splice(0, width).join(''));
    line = characters.join('');
  }
  lines.push(line);
  return lines;
}

/** The text, or its beginning and a mark. */
function cutText(text: string, width: number): string {
  const characters = [...text];
  return characters.length <= width
    ? text
    : `${characters
        .slice(0, Math.max(0, width - 1))
        .join('')
        .trimEnd()}${CUT}`;
}

function pad(text: string, width: number): string {
  return text + ' '.repeat(Math.max(0, width - characterCount(text)));
}
