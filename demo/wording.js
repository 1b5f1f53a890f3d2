// How the pages write a result: the same rule for digits as on the card, and the class with its shape.
const SHAPES = { acidic: '▼', neutral: '■', basic: '●' };

/** "5.13 ± 0.02": decimals follow the uncertainty. */
export function pHText({ pH, uncertainty }) {
  const decimals = uncertainty < 0.005 ? 3 : uncertainty < 0.195 ? 2 : uncertainty < 1.95 ? 1 : 0;
  const figures = new Intl.NumberFormat('en', { minimumFractionDigits: decimals, maximumFractionDigits: decimals });
  return `${figures.format(pH).replace('-', '−')} ± ${figures.format(Math.max(uncertainty, 0.001))}`;
}

export function classText({ classification, decided }) {
  return `${SHAPES[classification]} ${classification}${decided ? '' : ' (not certain)'}`;
}

/** "500 mL, 20 °C, open to air": what was set besides the solutes. */
export function conditionsText({ record }) {
  const { volume, temperature, air, solids } = record.conditions;
  return [volume, `${temperature} °C`, air === 'equilibrated' ? 'open to air' : 'air kept out', solids === 'equilibrated' && 'solids let form'].filter(Boolean).join(', ');
}

const moments = new Intl.DateTimeFormat('en-GB', { dateStyle: 'medium', timeStyle: 'short' });

export const momentText = (iso) => moments.format(new Date(iso));

/** What went wrong while storing, as a sentence for the person at the desk. */
export function failureText(error) {
  if (error?.name === 'QuotaExceededError') return 'This browser has no room left. Export and delete samples, then try again.';
  return `This browser refused to store it (${error?.message || error?.name || 'no reason given'}).`;
}

/** Writes into a live region; `alarm` adds a mark and weight. */
export function say(region, text, gravity = 'note') {
  region.dataset.gravity = gravity;
  region.textContent = text;
}
