/** Atoms by element. */
export type Atoms = ReadonlyMap<string, number>;

/**
 * Atoms of a formula with brackets and addition dots ("KAl(SO4)2·12H2O"), read without the package's own parser
 * so that the two check each other.
 */
export function atomsOf(formula: string): Atoms {
  const total = new Map<string, number>();
  for (const part of formula.split('·')) {
    const [, factor, body] = /^(\d+(?:\.\d+)?)?(.+)$/.exec(part)!;
    addTo(total, group(body!), Number(factor ?? 1));
  }
  return total;
}

function group(text: string): Map<string, number> {
  const stack = [new Map<string, number>()];
  const tokens = text.match(/[A-Z][a-z]?\d*|[([]|[)\]]\d*/g) ?? [];
  if (tokens.join('') !== text) throw new SyntaxError(`not a formula: ${text}`);
  for (const token of tokens) {
    const count = Number(/\d+$/.exec(token)?.[0] ?? 1);
    if (/^[([]/.test(token)) stack.push(new Map());
    else if (/^[)\]]/.test(token)) {
      const inner = stack.pop()!;
      addTo(stack.at(-1)!, inner, count);
    } else addTo(stack.at(-1)!, new Map([[token.replace(/\d+$/, ''), 1]]), count);
  }
  if (stack.length !== 1) throw new SyntaxError(`brackets do not close: ${text}`);
  return stack[0]!;
}

export function addTo(sum: Map<string, number>, atoms: Atoms, factor: number): void {
  for (const [element, count] of atoms) sum.set(element, (sum.get(element) ?? 0) + count * factor);
}

/** Waters by which the first composition exceeds the second; undefined when they differ by anything else. */
export function watersBetween(first: Atoms, second: Atoms): number | undefined {
  const difference = new Map(first);
  addTo(difference, second, -1);
  const waters = difference.get('O') ?? 0;
  addTo(difference, new Map([['H', 2], ['O', 1]]), -waters);
  return [...difference.values()].every((count) => Math.abs(count) < 1e-9) ? waters : undefined;
}
