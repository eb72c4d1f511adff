// Names and paths in TeX: a name with `_` is a quantity, set italic with an upright subscript; one
// without is a designator or a word, set upright and whole; a Greek letter's name is the letter.

/** Letters that TeX knows by these names. */
const GREEK = new Set(
  (
    'alpha beta gamma delta epsilon zeta eta theta iota kappa lambda mu nu xi pi rho sigma tau upsilon phi chi psi omega ' +
    'Gamma Delta Theta Lambda Xi Pi Sigma Upsilon Phi Psi Omega'
  ).split(' '),
);

/** Greek letters that look like a Latin one and have no name in TeX. */
const GREEK_AS_LATIN: ReadonlyMap<string, string> = new Map(
  Object.entries({
    omicron: 'o',
    Alpha: 'A',
    Beta: 'B',
    Epsilon: 'E',
    Zeta: 'Z',
    Eta: 'H',
    Iota: 'I',
    Kappa: 'K',
    Mu: 'M',
    Nu: 'N',
    Omicron: 'O',
    Rho: 'P',
    Tau: 'T',
    Chi: 'X',
  }),
);

/** Quantities whose usual symbol is another than their name read by the rule. */
const SYMBOLS: ReadonlyMap<string, { readonly base: string; readonly subscript: string }> = new Map(
  Object.entries({
    swing_up: { base: '\\hat{v}', subscript: 'up' },
    swing_down: { base: '\\hat{v}', subscript: 'down' },
  }),
);

/** Subscripts that the trade writes with parentheses. */
const SUBSCRIPTS: ReadonlyMap<string, string> = new Map(
  Object.entries({ GSoff: 'GS(off)', GSth: 'GS(th)', DSon: 'DS(on)' }),
);

/** `I_D` as I_{\mathrm{D}}, `Q1` as \mathrm{Q1}, `beta` as \beta; `name` is canonical (ASCII letters, digits, `_`). */
export function texOfName(name: string): string {
  return symbolOf(name, []);
}

/**
 * A path, such as `A1.I_D` or `A1.Qa.I_D`, set as its last name; the FET stands in the subscript, the
 * cell only where it is another one than `subject`.
 */
export function texOfPath(names: readonly string[], subject: string | null): string {
  const value = names[names.length - 1]!;
  const owners = names.slice(names.length > 1 && names[0] === subject ? 1 : 0, -1);
  return symbolOf(value, owners.length > 0 ? [owners.join('.')] : []);
}

function symbolOf(name: string, owners: readonly string[]): string {
  const known = SYMBOLS.get(name);
  if (known !== undefined) return `${known.base}_{${[known.subscript, ...owners].map(word).join(',\\,')}}`;
  const [head, ...rest] = name.split('_').filter((part) => part !== '');
  const isQuantity = name.includes('_');
  const subscripts = [...rest.map((part) => word(SUBSCRIPTS.get(part) ?? part)), ...owners.map(word)];
  const base = greek(head!) ?? (isQuantity ? italic(head!) : word(head!));
  return subscripts.length === 0 ? base : `${base}_{${subscripts.join(',\\,')}}`;
}

function italic(text: string): string {
  return text.length === 1 ? text : `\\mathit{${text}}`;
}

function word(text: string): string {
  return greek(text) ?? `\\mathrm{${text}}`;
}

function greek(text: string): string | null {
  if (GREEK.has(text)) return `\\${text}`;
  const latin = GREEK_AS_LATIN.get(text);
  return latin === undefined ? null : `\\mathrm{${latin}}`;
}
