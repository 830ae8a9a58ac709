/** Works out a printed sum: numbers, + − × /, brackets, true minus signs, narrow spaces between thousands. */
export function workedOut(text: string): number {
  const tokens = text.replaceAll('\u202f', '').match(/\d+(?:\.\d+)?|[+×/()\u2212]/g) ?? [];
  if (tokens.join('') !== text.replace(/\s/g, '')) throw new Error(`not a sum: ${text}`);
  let at = 0;

  function sum(): number {
    let value = product();
    while (tokens[at] === '+' || tokens[at] === '\u2212') {
      const sign = tokens[at] === '+' ? 1 : -1;
      at += 1;
      value += sign * product();
    }
    return value;
  }

  function product(): number {
    let value = factor();
    while (tokens[at] === '×' || tokens[at] === '/') {
      const divides = tokens[at] === '/';
      at += 1;
      const next = factor();
      value = divides ? value / next : value * next;
    }
    return value;
  }

  function factor(): number {
    const token = tokens[at];
    at += 1;
    if (token === '\u2212') return -factor();
    if (token !== '(') return Number(token);
    const value = sum();
    if (tokens[at] !== ')') throw new Error(`a bracket is open in ${text}`);
    at += 1;
    return value;
  }

  const value = sum();
  if (at !== tokens.length) throw new Error(`something is left over in ${text}`);
  return value;
}

/** The number a text stands for, with a true minus sign. */
export function numberIn(text: string): number {
  return Number(text.replaceAll('\u202f', '').replace('\u2212', '-'));
}
