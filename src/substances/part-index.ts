import type { Contribution } from './ion-library.js';

/** Parts of a contribution with their number, as keys; metals first, then families, then ions. */
export function partsOfContribution({ metals, families, ions }: Contribution): [key: string, units: number][] {
  return [
    ...Object.entries(metals ?? {}).map(([key, units]): [string, number] => [`metal ${key}`, units]),
    ...Object.entries(families ?? {}).map(([key, units]): [string, number] => [`family ${key}`, units]),
    ...Object.entries(ions ?? {}).map(([key, units]): [string, number] => [`ion ${key}`, units]),
  ];
}

/** Things made of metals, families and ions, found by what is present. */
export class PartIndex<Thing extends { readonly gives: Contribution }> {
  /** By the first of their parts, so that a solution is compared with few of them. */
  readonly #byFirstPart = new Map<string, { readonly thing: Thing; readonly others: readonly string[] }[]>();

  constructor(things: Iterable<Thing>) {
    for (const thing of things) {
      const [first, ...others] = partsOfContribution(thing.gives).map(([key]) => key);
      const list = this.#byFirstPart.get(first!);
      if (list) list.push({ thing, others });
      else this.#byFirstPart.set(first!, [{ thing, others }]);
    }
  }

  /** Every thing whose parts are all present. @param present part keys. */
  madeOf(present: ReadonlySet<string>): Thing[] {
    const found: Thing[] = [];
    for (const key of present) {
      for (const { thing, others } of this.#byFirstPart.get(key) ?? []) if (others.every((other) => present.has(other))) found.push(thing);
    }
    return found;
  }
}
