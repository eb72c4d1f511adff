// Names as the trade writes them, for figures, page and record alike: which letters are Greek, which subscripts bear
// parentheses, and which quantities have a symbol of their own.

/** Letters by their names; those of the Latin shape are the Latin letters. */
const GREEK: ReadonlyMap<string, string> = new Map(
  Object.entries({
    alpha: 'α',
    beta: 'β',
    gamma: 'γ',
    delta: 'δ',
    epsilon: 'ε',
    zeta: 'ζ',
    eta: 'η',
    theta: 'θ',
    iota: 'ι',
    kappa: 'κ',
    lambda: 'λ',
    mu: 'μ',
    nu: 'ν',
    xi: 'ξ',
    omicron: 'o',
    pi: 'π',
    rho: 'ρ',
    sigma: 'σ',
    tau: 'τ',
    upsilon: 'υ',
    phi: 'φ',
    chi: 'χ',
    psi: 'ψ',
    omega: 'ω',
    Alpha: 'A',
    Beta: 'B',
    Gamma: 'Γ',
    Delta: 'Δ',
    Epsilon: 'E',
    Zeta: 'Z',
    Eta: 'H',
    Theta: 'Θ',
    Iota: 'I',
    Kappa: 'K',
    Lambda: 'Λ',
    Mu: 'M',
    Nu: 'N',
    Xi: 'Ξ',
    Omicron: 'O',
    Pi: 'Π',
    Rho: 'P',
    Sigma: 'Σ',
    Tau: 'T',
    Upsilon: 'Υ',
    Phi: 'Φ',
    Chi: 'X',
    Psi: 'Ψ',
    Omega: 'Ω',
  }),
);

/** Subscripts that the trade writes with parentheses. */
const SUBSCRIPTS: ReadonlyMap<string, string> = new Map(
  Object.entries({ GSoff: 'GS(off)', GSth: 'GS(th)', DSon: 'DS(on)' }),
);

/** Quantities whose usual symbol is another than their name read by the rule: a letter under a hat. */
const PEAKS: ReadonlyMap<string, { readonly head: string; readonly subscript: string }> = new Map(
  Object.entries({
    swing_up: { head: 'v', subscript: 'up' },
    swing_down: { head: 'v', subscript: 'down' },
  }),
);

interface SymbolName {
  /** As it is spelled: `V`, `beta`, `headroom`. */
  readonly head: string;
  /** The character of a Greek head; null for another. */
  readonly letter: string | null;
  /** A peak value: the head stands under a hat. */
  readonly hat: boolean;
  readonly style: 'italic' | 'upright';
  /** As they are shown, Greek names still spelled out. */
  readonly subscripts: readonly string[];
}

/** Takes a name apart: `V_GSoff` is an italic V with GS(off) below, `Q1` a designator, upright and whole. */
export function symbolName(name: string): SymbolName {
  const peak = PEAKS.get(name);
  if (peak) return { head: peak.head, letter: null, hat: true, style: 'italic', subscripts: [peak.subscript] };
  const [head = '', ...rest] = name.split('_').filter((part) => part !== '');
  const letter = greekLetter(head);
  const style = letter === null ? name.includes('_') : /[α-ω]/.test(letter);
  return {
    head,
    letter,
    hat: false,
    style: style ? 'italic' : 'upright',
    subscripts: rest.map((part) => SUBSCRIPTS.get(part) ?? part),
  };
}

/** The letter that a Greek letter's name stands for; null for another word. */
export function greekLetter(name: string): string | null {
  return GREEK.get(name) ?? null;
}
