import { html, svg, type TemplateResult } from 'lit';
import type { Prediction } from '../engine.js';
import { renderClassShape } from './class-shapes.js';
import { decimalsFor, type Numbers } from './numbers.js';
import { english as strings } from './strings/english.js';

const LOWEST = 0;
const HIGHEST = 14;
/** Percent of the width below which the band would be thinner than the marker's line. */
const THINNEST_BAND = 0.4;

/** The pH scale with the neutral point, the prediction and its uncertainty; wider than 0 to 14 when it must be. */
export function renderScale(prediction: Prediction, numbers: Numbers): TemplateResult {
  const { pH, uncertainty, neutralPH, classification, inAir, withoutAir } = prediction;
  const lowest = Math.min(LOWEST, Math.floor(pH - uncertainty));
  const highest = Math.max(HIGHEST, Math.ceil(pH + uncertainty));
  const percent = (value: number) => ((value - lowest) / (highest - lowest)) * 100;
  const at = (value: number) => `${percent(value).toFixed(2)}%`;
  const band = Math.max(THINNEST_BAND, percent(pH + uncertainty) - percent(pH - uncertainty));
  const step = highest - lowest > 20 ? 5 : 2;
  const other = otherAir(prediction);
  const values = Array.from({ length: highest - lowest + 1 }, (_, index) => lowest + index);
  const labelled = values.filter((value) => value % step === 0);
  const ticks = values.map((value) => `M${value} 18V${labelled.includes(value) ? 26 : 23}`).join('');
  return html`
    <div class="scale" part="scale" dir="ltr">
      <svg role="img" aria-label=${describe(prediction, numbers, lowest, highest, other)} width="100%" height="42" focusable="false">
        <rect class="band" x=${`${(percent(pH) - band / 2).toFixed(2)}%`} width=${`${band.toFixed(2)}%`} y="14" height="8"></rect>
        <line class="rule" x1="0%" x2="100%" y1="18" y2="18"></line>
        <svg viewBox=${`${lowest} 0 ${highest - lowest} 42`} width="100%" height="42" preserveAspectRatio="none" overflow="visible"><path class="tick" d=${ticks}></path></svg>
        ${labelled.map((value) => svg`<text class="tick-label" x=${at(value)} y="39" text-anchor="middle">${numbers.fixed(value, 0)}</text>`)}
        <line class="neutral-point" x1=${at(neutralPH)} x2=${at(neutralPH)} y1="10" y2="26"></line>
        ${other === undefined ? '' : svg`<line class="other-air" x1=${at(inAir)} x2=${at(withoutAir)} y1="18" y2="18"></line>
        <svg class="other-air" x=${at(other)} y="18" overflow="visible"><circle r="3"></circle></svg>`}
        <line class="pointer" x1=${at(pH)} x2=${at(pH)} y1="12" y2="22"></line>
        <svg class="marker" x=${at(pH)} y="6" overflow="visible">${renderClassShape(classification)}</svg>
      </svg>
    </div>
  `;
}

/** pH under the other condition of air, when it differs by more than the uncertainty. */
export function otherAir({ inAir, withoutAir, uncertainty, conditions }: Prediction): number | undefined {
  if (!(Math.abs(inAir - withoutAir) > uncertainty)) return undefined;
  return conditions.air === 'excluded' ? inAir : withoutAir;
}

function describe(prediction: Prediction, numbers: Numbers, lowest: number, highest: number, other: number | undefined): string {
  const { pH, uncertainty, neutralPH } = prediction;
  const decimals = decimalsFor(uncertainty);
  const distance = Number(Math.abs(pH - neutralPH).toFixed(decimals));
  const side = distance === 0 ? 'at' : pH < neutralPH ? 'below' : 'above';
  const described = strings.scale.described(
    numbers.fixed(lowest, 0), numbers.fixed(highest, 0), numbers.pH(pH, uncertainty), numbers.uncertainty(uncertainty),
    numbers.fixed(neutralPH, 2), numbers.fixed(distance, decimals), side,
  );
  return other === undefined ? described : `${described} ${strings.scale.otherAir(numbers.pH(other, Math.max(uncertainty, 0.02)))}`;
}
