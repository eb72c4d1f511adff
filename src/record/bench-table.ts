// A table of plain texts, made column by column.

interface TableHead {
  readonly title: string;
  /** The whole title is the name of a quantity. */
  readonly isName: boolean;
  readonly isNumber: boolean;
}

export interface BenchTable {
  /** `fits`, `readings`, `matching`, `fitting`, `specimens`. */
  readonly name: string;
  /** What it shows, in a sentence. */
  readonly caption: string;
  readonly columns: readonly TableHead[];
  readonly rows: readonly (readonly string[])[];
}

/** A column with its texts. */
interface FilledColumn extends TableHead {
  readonly texts: readonly string[];
}

/** The columns side by side; all are as long as the first. */
export function byColumns(columns: readonly FilledColumn[]): Pick<BenchTable, 'columns' | 'rows'> {
  return {
    columns: columns.map(({ title, isName, isNumber }) => ({ title, isName, isNumber })),
    rows: columns[0]!.texts.map((_, row) => columns.map(({ texts }) => texts[row]!)),
  };
}

/** The names of specimens, down a column. */
export function namesOf(specimens: readonly { readonly name: string }[]): string[] {
  return specimens.map(({ name }) => name);
}

/** A column of words. */
export function word(title: string, texts: readonly string[]): FilledColumn {
  return { title, isName: false, isNumber: false, texts };
}

/** A column of numbers, which stand to the right. */
export function number(title: string, texts: readonly string[]): FilledColumn {
  return { title, isName: false, isNumber: true, texts };
}

/** A column of numbers under the name of their quantity. */
export function quantity(name: string, texts: readonly string[]): FilledColumn {
  return { title: name, isName: true, isNumber: true, texts };
}
