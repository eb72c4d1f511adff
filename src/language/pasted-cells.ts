// Text from a spreadsheet or an instrument, cut into lines of cells: which mark separates them and which one is
// the decimal mark is told from the whole text.

/** A line of cells with its number in the pasted text, from 1. */
export interface PastedLine {
  readonly number: number;
  readonly cells: readonly string[];
}

interface PastedCells {
  readonly separator: 'tab' | 'semicolon' | 'comma';
  readonly lines: readonly PastedLine[];
}

/** Cuts a text into cells; lines without any are left out. A cell in quotation marks may hold the separator. */
export function pastedCells(text: string): PastedCells {
  const raw = text.split(/\r\n|\r|\n/);
  const separator = separatorOf(raw);
  const mark = { tab: '\t', semicolon: ';', comma: ',' }[separator];
  const lines = raw
    .map((line, index): PastedLine => ({ number: index + 1, cells: cut(line, mark) }))
    .filter(({ cells }) => cells.some((cell) => cell !== ''));
  return { separator, lines };
}

/** A comma separates only where neither of the others does: it may be a decimal mark. */
function separatorOf(lines: readonly string[]): PastedCells['separator'] {
  if (lines.some((line) => line.includes('\t'))) return 'tab';
  return lines.some((line) => line.includes(';')) ? 'semicolon' : 'comma';
}

function cut(line: string, mark: string): string[] {
  const cells: string[] = [];
  let cell = '';
  let isQuoted = false;
  for (let at = 0; at < line.length; at++) {
    const sign = line[at]!;
    if (sign === '"' && isQuoted && line[at + 1] === '"') {
      cell += sign;
      at++;
    } else if (sign === '"') isQuoted = !isQuoted;
    else if (sign === mark && !isQuoted) {
      cells.push(cell);
      cell = '';
    } else cell += sign;
  }
  return [...cells, cell].map((each) => each.trim());
}

const COMMA_NUMBER = /^[+\-−]?\d+(,\d+)+(e[+\-−]?\d+)?(?!.*\.)/i;

/** What the comma inside the numbers of a text is. */
type DecimalMark = 'point' | 'comma' | 'either';

/**
 * Tells the decimal mark from all cells: a comma with other than three digits behind it is one, and so is a comma behind a point;
 * where every comma has three digits behind it and nothing else decides, it is `either`.
 */
export function decimalMark(cells: readonly string[]): DecimalMark {
  const withComma = cells.filter((cell) => /\d,\d/.test(cell));
  if (withComma.length === 0) return 'point';
  if (withComma.some((cell) => /\d,\d+\.\d/.test(cell))) return 'point';
  if (withComma.some((cell) => /\.\d{3},\d/.test(cell))) return 'comma';
  const numbers = withComma.filter((cell) => COMMA_NUMBER.test(cell));
  if (numbers.some((cell) => !/^[+\-−]?[1-9]\d{0,2}(,\d{3})+(?!\d)/.test(cell))) return 'comma';
  const hasPoint = cells.some((cell) => /^[+\-−]?\d+\.\d+/.test(cell));
  return hasPoint ? 'point' : 'either';
}

/** A cell's number with a decimal point and without marks between its thousands; what follows it stays. */
export function withPoint(cell: string, mark: 'point' | 'comma'): string {
  const [, number, behind] = /^([+\-−]?[\d.,\u00a0\u202f ]*\d(?:[eE][+\-−]?\d+)?)(.*)$/su.exec(cell) ?? [
    null,
    '',
    cell,
  ];
  const groups = mark === 'point' ? /,/g : /\./g;
  const plain = number!
    .replace(/[\u00a0\u202f ]/g, '')
    .replace(groups, '')
    .replace(',', '.')
    .replace('−', '-');
  return plain + behind!;
}
