import { svg, type SVGTemplateResult } from 'lit';
import type { Prediction } from '../engine.js';

/** Silhouettes about the origin, 12 units wide, so that the class is told by shape as well as by word and colour. */
const SHAPES: Readonly<Record<Prediction['classification'], string>> = {
  acidic: 'M-6-5.5H6L0 5.5Z',
  neutral: 'M-5-5H5V5H-5Z',
  basic: 'M0-6A6 6 0 1 1 0 6A6 6 0 1 1 0-6Z',
};

export function renderClassShape(classification: Prediction['classification']): SVGTemplateResult {
  return svg`<path class="shape" d=${SHAPES[classification]}></path>`;
}
