// The classes of characters that the sheet's grammar knows, and the Latin spelling of Greek letters.

const GREEK: Readonly<Record<string, string>> = {
  α: 'alpha',
  β: 'beta',
  γ: 'gamma',
  δ: 'delta',
  ε: 'epsilon',
  ζ: 'zeta',
  η: 'eta',
  θ: 'theta',
  ι: 'iota',
  κ: 'kappa',
  λ: 'lambda',
  μ: 'mu',
  ν: 'nu',
  ξ: 'xi',
  ο: 'omicron',
  π: 'pi',
  ρ: 'rho',
  σ: 'sigma',
  ς: 'sigma',
  τ: 'tau',
  υ: 'upsilon',
  φ: 'phi',
  χ: 'chi',
  ψ: 'psi',
  ω: 'omega',
  Α: 'Alpha',
  Β: 'Beta',
  Γ: 'Gamma',
  Δ: 'Delta',
  Ε: 'Epsilon',
  Ζ: 'Zeta',
  Η: 'Eta',
  Θ: 'Theta',
  Ι: 'Iota',
  Κ: 'Kappa',
  Λ: 'Lambda',
  Μ: 'Mu',
  Ν: 'Nu',
  Ξ: 'Xi',
  Ο: 'Omicron',
  Π: 'Pi',
  Ρ: 'Rho',
  Σ: 'Sigma',
  Τ: 'Tau',
  Υ: 'Upsilon',
  Φ: 'Phi',
  Χ: 'Chi',
  Ψ: 'Psi',
  Ω: 'Omega',
  // The micro and ohm signs, and the letter forms that fonts and formula editors offer beside the plain ones.
  '\u00b5': 'mu',
  '\u2126': 'Omega',
  ϑ: 'theta',
  ϕ: 'phi',
  ϖ: 'pi',
  ϰ: 'kappa',
  ϱ: 'rho',
  ϵ: 'epsilon',
};

/** Whether a UTF-16 unit is a blank inside a line: space, tab, a lone carriage return, the no-break and thin blanks. */
export function isBlank(code: number): boolean {
  return code === 32 || code === 9 || code === 0xa0 || code === 0x202f || code === 0x2009 || code === 13;
}

/** Whether a UTF-16 unit is a decimal digit. */
export function isDigit(code: number): boolean {
  return code >= 48 && code <= 57;
}

/** Whether a UTF-16 unit may begin a name: a Latin letter without accent, or a Greek one. */
export function isLetter(code: number): boolean {
  if ((code >= 97 && code <= 122) || (code >= 65 && code <= 90)) return true;
  return code > 127 && String.fromCharCode(code) in GREEK;
}

/** Whether a UTF-16 unit may continue a name: letter, digit or underscore. */
export function isNamePart(code: number): boolean {
  return isLetter(code) || isDigit(code) || code === 95;
}

/** The spelling under which a name is known: Greek letters by their Latin names (`λ_1` is `lambda_1`). */
export function canonicalName(written: string): string {
  let plain = true;
  for (let i = 0; i < written.length; i++) if (written.charCodeAt(i) > 127) plain = false;
  return plain ? written : Array.from(written, (letter) => GREEK[letter] ?? letter).join('');
}

/** The first position at or after `at`, and not beyond `limit`, that holds no blank. */
export function skipBlanks(text: string, at: number, limit: number): number {
  let i = at;
  while (i < limit && isBlank(text.charCodeAt(i))) i++;
  return i;
}

/** The last position at or before `limit`, and not before `start`, that has no blank in front of it. */
export function trimEnd(text: string, start: number, limit: number): number {
  let i = limit;
  while (i > start && isBlank(text.charCodeAt(i - 1))) i--;
  return i;
}

/** The end of the run of name characters that begins at `at`. */
export function nameEnd(text: string, at: number, limit: number): number {
  let i = at;
  while (i < limit && isNamePart(text.charCodeAt(i))) i++;
  return i;
}
