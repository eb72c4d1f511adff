// Reads the TeX of arithmetic back and computes it: the oracle for parentheses, fractions and signs.
// Precedence as a reader of formulas has it: a product binds tighter than ∥, ∥ tighter than a sum.

export type Values = Readonly<Record<string, number>>;

/** The value of TeX as `texOfExpression` writes it for numbers and names; `values` is keyed by TeX symbol. */
export function texValue(tex: string, values: Values): number {
  const tokens = tokensOf(tex, values);
  let at = 0;

  const value = sum();
  if (at < tokens.length) throw new Error(`TeX goes on with ${tokens[at]} in ${tex}`);
  return value;

  function sum(): number {
    let total = signedParallel();
    while (tokens[at] === '+' || tokens[at] === '-') {
      const sign = tokens[at++];
      if (tokens[at] === '+' || tokens[at] === '-') throw new Error(`Two signs in a row in ${tex}`);
      const term = parallel();
      total = sign === '+' ? total + term : total - term;
    }
    return total;
  }
  function signedParallel(): number {
    if (tokens[at] === '-' || tokens[at] === '+') return tokens[at++] === '-' ? -product() : product();
    return parallel();
  }
  function parallel(): number {
    let total = product();
    while (tokens[at] === '\\parallel') {
      at++;
      const other = product();
      total = (total * other) / (total + other);
    }
    return total;
  }
  function product(): number {
    let total = power();
    while (at < tokens.length) {
      const token = tokens[at]!;
      if (token === '\\cdot' || token === '\\,') at++;
      else if (!startsFactor(token)) return total;
      total *= power();
    }
    return total;
  }
  function startsFactor(token: string): boolean {
    return /^[\d.]+$/.test(token) || token in values || ['\\frac', '\\sqrt', '\\left(', '\\left|', '{'].includes(token);
  }
  function power(): number {
    const base = atom();
    if (tokens[at] !== '^') return base;
    at++;
    return base ** braces();
  }
  function atom(): number {
    const token = tokens[at++]!;
    if (token in values) return values[token]!;
    if (/^[\d.]+$/.test(token)) return Number(token);
    switch (token) {
      case '\\frac': {
        const above = braces();
        return above / braces();
      }
      case '\\sqrt':
        return Math.sqrt(braces());
      case '\\left(':
        return closed('\\right)');
      case '\\left|':
        return Math.abs(closed('\\right|'));
      case '{':
        return closed('}');
      default:
        throw new Error(`${token} is not read, in ${tex}`);
    }
  }
  function braces(): number {
    if (tokens[at++] !== '{') throw new Error(`A brace is missing in ${tex}`);
    const inner = sum();
    if (tokens[at] === '/') {
      at++;
      const below = sum();
      if (tokens[at++] !== '}') throw new Error(`A brace is not closed in ${tex}`);
      return inner / below;
    }
    if (tokens[at++] !== '}') throw new Error(`A brace is not closed in ${tex}`);
    return inner;
  }
  function closed(mark: string): number {
    const inner = sum();
    if (tokens[at++] !== mark) throw new Error(`${mark} is missing in ${tex}`);
    return inner;
  }
}

function tokensOf(tex: string, values: Values): string[] {
  const symbols = Object.keys(values).toSorted((a, b) => b.length - a.length);
  const tokens: string[] = [];
  let rest = tex;
  while (rest !== '') {
    const symbol = symbols.find((each) => rest.startsWith(each));
    const token = symbol ?? /^(?:\\left[(|]|\\right[)|]|\\[A-Za-z]+|\\,|\d+(?:\.\d+)?|[^])/.exec(rest)![0];
    if (token.trim() !== '') tokens.push(token);
    rest = rest.slice(token.length);
  }
  return tokens;
}
