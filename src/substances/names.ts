/**
 * A name in the form in which names are compared: lower case, single spaces, plain hyphens, no hyphen or space at the
 * places where usage wavers ("hydrogen carbonate", "hydrogencarbonate"; "tri-sodium", "trisodium").
 */
export function comparableName(name: string): string {
  return name
    .normalize('NFKC')
    .toLowerCase()
    .replace(/[\u2010-\u2015\u2212]/g, '-')
    .replace(/['’`´]/g, '’')
    .replace(/\bsulph/g, 'sulf')
    .replace(/aluminum/g, 'aluminium')
    .replace(/cesium/g, 'caesium')
    .replace(/\s*\(\s*([ivx]+)\s*\)\s*/g, '($1) ')
    .replace(/(?:hydrogen|bi)[\s-]+(?=[a-z])/g, (match) => match.replace(/[\s-]+$/, ''))
    .replace(/[\s_]+/g, ' ')
    .replace(/-/g, '')
    .trim();
}

const HYDRATE_WORDS: Readonly<Record<string, number>> = {
  anhydrous: 0,
  hemihydrate: 0.5,
  monohydrate: 1,
  sesquihydrate: 1.5,
  dihydrate: 2,
  trihydrate: 3,
  tetrahydrate: 4,
  pentahydrate: 5,
  hexahydrate: 6,
  heptahydrate: 7,
  octahydrate: 8,
  nonahydrate: 9,
  decahydrate: 10,
  dodecahydrate: 12,
};

/** Takes a hydrate word off a name: "sodium carbonate decahydrate" gives 10. `water` is undefined when none stands there. */
export function splitHydrateWord(name: string): { base: string; water?: number } {
  const match = /^(.+?),? ([a-z]+)$/i.exec(name.trim());
  const word = match?.[2]!.toLowerCase();
  return word !== undefined && Object.hasOwn(HYDRATE_WORDS, word) ? { base: match![1]!, water: HYDRATE_WORDS[word]! } : { base: name };
}
