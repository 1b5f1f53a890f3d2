import { formatChemical } from './plain-text.js';
import type { Chemical, Prediction, Reason } from './prediction.js';
import type { ProtonAccount, ProtonAccounts } from './proton-accounts.js';
import type { Dissolved } from './dissolve.js';
import type { SolvedSolution } from './solved-solution.js';
import { chemicalOf, HYDROXIDE, PROTON } from './chemicals.js';

/** Share of the free acid or base that must be unspent for it to decide by itself. */
const UNSPENT = 0.5;
/** Two states of one family each of at least this share stand side by side. */
const SIDE_BY_SIDE = 0.03;

/** One sentence that says what decides the pH. */
export function reasonFor(classification: Prediction['classification'], accounts: ProtonAccounts, solved: SolvedSolution, dissolved: Dissolved): Reason {
  const strong = classification === 'neutral' ? undefined : strongReason(accounts, solved, dissolved);
  if (strong) return strong;
  const pair = bufferPair(accounts, solved);
  if (pair) return pair;
  const donors = accounts.components.filter((account) => account.particles.length > 0 && account.donated > 0).sort((a, b) => b.donated - a.donated);
  const acceptors = accounts.components.filter((account) => account.particles.length > 0 && account.accepted > 0).sort((a, b) => b.accepted - a.accepted);
  if (classification === 'neutral') return neutralReason(donors[0], acceptors[0], solved);
  const decisive = classification === 'acidic' ? donors[0] : acceptors[0];
  const other = classification === 'acidic' ? acceptors[0] : donors[0];
  if (!decisive) return airReason(classification);
  return oneSided(classification, decisive, other, solved);
}

function oneSided(classification: 'acidic' | 'basic', decisive: ProtonAccount, other: ProtonAccount | undefined, solved: SolvedSolution): Reason {
  const chemical = shownAs(decisive);
  const name = formatChemical(chemical);
  const acidic = classification === 'acidic';
  const code = acidic ? 'donor-decides' : 'acceptor-decides';
  const own = acidic ? 'gives up a proton' : 'takes up a proton';
  const opposite = acidic ? 'takes one up' : 'gives one up';
  if (other && other.component === decisive.component) {
    return { code, chemical, text: `${name} ${own} more readily than it ${opposite}: ${classification}.` };
  }
  const against = other ? shownAs(other) : counterIon(solved, chemical.charge);
  if (!against) return { code, chemical, text: `${name} ${own}${acidic ? ' to water' : ' from water'}: ${classification}.` };
  // A cation takes up no proton, so there is nothing to compare the donor with.
  if (!other && acidic && against.charge > 0) return { code, chemical, against, text: `${name} ${own} to water, and ${formatChemical(against)} takes no part: acidic.` };
  return { code, chemical, against, text: `${name} ${own} more readily than ${formatChemical(against)} ${opposite}: ${classification}.` };
}

function neutralReason(donor: ProtonAccount | undefined, acceptor: ProtonAccount | undefined, solved: SolvedSolution): Reason {
  const water = solved.state.molality[solved.model.species.findIndex((species) => species.chemical.id === 'OH-')]!;
  const donorActs = donor !== undefined && donor.donated > water;
  const acceptorActs = acceptor !== undefined && acceptor.accepted > water;
  if (donorActs && acceptorActs && donor.component === acceptor.component) {
    const chemical = shownAs(donor);
    return { code: 'balance', chemical, text: `${formatChemical(chemical)} gives up a proton about as readily as it takes one up: neutral.` };
  }
  if (donorActs && acceptorActs) {
    const chemical = shownAs(donor);
    const against = shownAs(acceptor);
    return { code: 'balance', chemical, against, text: `${formatChemical(chemical)} gives up a proton about as readily as ${formatChemical(against)} takes one up: neutral.` };
  }
  return { code: 'nothing-reacts', text: 'No dissolved ion gives up or takes up protons to an extent that counts; water decides: neutral.' };
}

/** No dissolved ion did it, so it is the gas of the air. */
function airReason(classification: 'acidic' | 'basic'): Reason {
  if (classification === 'acidic') return { code: 'donor-decides', text: 'Dissolved CO₂ from the air gives up a proton: acidic.' };
  return { code: 'balance', text: 'No dissolved ion decides; the medium shifts the balance of H⁺ and OH⁻: basic.' };
}

/** A strong acid or base of which most is unspent. */
function strongReason(accounts: ProtonAccounts, solved: SolvedSolution, { solutes }: Dissolved): Reason | undefined {
  if (accounts.unspent === 0) return undefined;
  const acid = accounts.unspent > 0;
  const chemical = acid ? PROTON : HYDROXIDE;
  const free = solved.state.molality[solved.model.species.findIndex((species) => species.chemical.id === chemical.id)]!;
  if (free < UNSPENT * Math.abs(accounts.unspent)) return undefined;
  const names = solutes
    .filter(({ read }) => read.substance.parts.some(({ particle }) => accounts.strongParticles.some((strong) => strong.particle === particle && Math.sign(particle.gives!.protons!) === Math.sign(accounts.unspent))))
    .map(({ read }) => formatChemical({ label: read.substance.formula, charge: 0 }))
    .join(', ');
  return acid
    ? { code: 'strong-acid', chemical, text: `${names} gives its protons to water completely, and nothing takes them up: acidic.` }
    : { code: 'strong-base', chemical, text: `${names} sets hydroxide free, and nothing takes it up: basic.` };
}

/** A family put in as two states, or partly neutralised, whose neighbours hold the pH. */
function bufferPair(accounts: ProtonAccounts, solved: SolvedSolution): Reason | undefined {
  const total = accounts.components.reduce((sum, account) => sum + account.buffering, 0);
  const main = [...accounts.components].sort((a, b) => b.buffering - a.buffering)[0];
  if (!main || main.meaning.kind !== 'family' || main.particles.length === 0 || main.buffering < 0.5 * total) return undefined;
  if (Number.isInteger(main.initialProtonation)) return undefined;
  const states = main.meaning.family.states
    .map((state, index) => ({ state, molality: solved.state.molality[main.meaning.firstSpecies + index]! }))
    .sort((a, b) => b.molality - a.molality);
  const [first, second] = states;
  if (!first || !second || second.molality < SIDE_BY_SIDE * main.total) return undefined;
  const { states: all } = main.meaning.family;
  const acid: Chemical = all.indexOf(first.state) < all.indexOf(second.state) ? first.state : second.state;
  const base: Chemical = acid === first.state ? second.state : first.state;
  const step = all.findIndex((state) => state.id === acid.id);
  const pKa = -main.meaning.constants[step]!.log10K;
  return { code: 'buffer-pair', chemical: acid, against: base, text: `${formatChemical(acid)} and ${formatChemical(base)} stand side by side and hold the pH near the pKa of ${pKa.toFixed(2)}.` };
}

/** How the component is named in the sentence: as the particle that brought most of it, or what that becomes at once. */
export function shownAs(account: ProtonAccount): Chemical {
  const main = [...account.particles].sort((a, b) => b.molality - a.molality)[0]!.particle;
  if (account.meaning.kind === 'metal') {
    const { metal } = account.meaning;
    return main.id === metal.ion ? { id: metal.ion, label: metal.formula, charge: metal.charge, name: metal.name } : chemicalOf(main);
  }
  if (account.meaning.kind === 'ligand') return chemicalOf(main);
  const { states } = account.meaning.family;
  const entered = states[states.length - 1 - Math.round(account.initialProtonation)];
  return entered === undefined ? chemicalOf(main) : { id: entered.id, label: entered.label, charge: entered.charge, name: entered.name };
}

/** The most abundant spectator of the opposite charge. */
function counterIon(solved: SolvedSolution, charge: number): Chemical | undefined {
  let best: Chemical | undefined;
  let most = 0;
  for (const index of solved.model.spectators) {
    const { chemical } = solved.model.species[index]!;
    if (Math.sign(chemical.charge) !== -Math.sign(charge) || solved.state.molality[index]! <= most) continue;
    most = solved.state.molality[index]!;
    best = chemical;
  }
  return best;
}
