import { css } from 'lit';
import { cautionStyles } from './cautions.styles.js';
import { mediaStyles } from './media.styles.js';
import { sectionStyles } from './sections.styles.js';

const frameStyles = css`
  :host {
    display: block;
    container-type: inline-size;
    /* Cards far from the window cost neither layout nor paint, and hold their place meanwhile. */
    content-visibility: auto;
    contain-intrinsic-inline-size: auto 15rem;
    contain-intrinsic-block-size: auto var(--solute-placeholder-size, 21rem);
    min-inline-size: 0;
    max-inline-size: 60rem;
    margin-block: 1rem;
    text-align: start;
  }
  :host(:state(waiting)) {
    content-visibility: visible;
    min-block-size: var(--solute-placeholder-size, 21rem);
  }
  :host([hidden]) {
    display: none;
  }
  *,
  *::before,
  *::after {
    box-sizing: border-box;
  }
  .card {
    --_ink: var(--solute-ink, light-dark(#1c2024, #e8eaec));
    --_muted: var(--solute-muted, light-dark(#575e66, #a3abb4));
    --_surface: var(--solute-surface, light-dark(#fcfcfb, #15181b));
    --_sunken: light-dark(#f2f2ef, #1d2125);
    --_line: var(--solute-line, light-dark(#d5d7d4, #363c42));
    --_edge: light-dark(#868c90, #6f777f);
    --_acidic: var(--solute-acidic, light-dark(#a63a18, #f0906a));
    --_neutral: var(--solute-neutral, light-dark(#3f6347, #8fc49b));
    --_basic: var(--solute-basic, light-dark(#2a4f9c, #8fb2f5));
    --_danger: var(--solute-danger, light-dark(#a01230, #ff8d9c));
    --_warning: var(--solute-warning, light-dark(#7a5200, #e6b655));
    --_focus: var(--solute-focus, light-dark(#1c5fd0, #8fb8ff));
    --_space: var(--solute-space, 0.5rem);
    --_accent: var(--_muted);
    padding: calc(2 * var(--_space)) calc(2.5 * var(--_space));
    border: 1px solid var(--_line);
    border-radius: var(--solute-radius, 2px);
    background: var(--_surface);
    color: var(--_ink);
    font-family: var(--solute-font, system-ui, -apple-system, 'Segoe UI', 'Noto Sans', 'Liberation Sans', sans-serif);
    font-size: var(--solute-font-size, 0.9375rem);
    font-style: normal;
    font-weight: 400;
    font-variant-numeric: tabular-nums lining-nums;
    line-height: 1.45;
    letter-spacing: normal;
    text-indent: 0;
    text-transform: none;
    white-space: normal;
    overflow-wrap: anywhere;
    /* Holds what is only heard, so that it does not enlarge a part of the page that scrolls. */
    position: relative;
    display: grid;
    grid-template-columns: minmax(0, 1fr);
    row-gap: calc(1.5 * var(--_space));
    transition: opacity 120ms 200ms;
  }
  .card.acidic {
    --_accent: var(--_acidic);
  }
  .card.neutral {
    --_accent: var(--_neutral);
  }
  .card.basic {
    --_accent: var(--_basic);
  }
  :host(:state(predicting)) .card {
    opacity: 0.55;
  }
  .card:focus-visible {
    outline: 2px solid var(--_focus);
    outline-offset: -3px;
  }
  button:focus-visible {
    outline: 2px solid var(--_focus);
    outline-offset: 2px;
  }
  .card:focus:not(:focus-visible) {
    outline: none;
  }
  p,
  ul,
  dl,
  dd {
    margin: 0;
    padding: 0;
  }
  ul {
    list-style: none;
  }
  sub,
  sup {
    font-size: 0.72em;
    line-height: 0;
    position: relative;
    vertical-align: baseline;
  }
  sub {
    inset-block-end: -0.25em;
  }
  sup {
    inset-block-end: 0.42em;
  }
  /* Words and figures keep their own direction in a page written the other way. */
  .sentence,
  .solute-name,
  .solute-facts > span,
  .conditions > span,
  .fact,
  .count,
  dd,
  td {
    unicode-bidi: plaintext;
  }
  .label,
  .sentence,
  .solute-name {
    text-align: -webkit-match-parent;
    text-align: match-parent;
  }
  .formula,
  .term,
  .fact {
    white-space: nowrap;
  }
  .origin {
    color: var(--_muted);
    font-size: 0.8667em;
  }
  .visually-hidden {
    position: absolute;
    inline-size: 1px;
    block-size: 1px;
    margin: 0;
    overflow: hidden;
    clip-path: inset(50%);
    white-space: nowrap;
    user-select: none;
  }
`;

const readingStyles = css`
  .label {
    font-weight: 600;
    font-size: 1.0667em;
    line-height: 1.3;
  }
  .understood {
    display: grid;
    row-gap: var(--_space);
  }
  .understood li {
    display: flex;
    flex-wrap: wrap;
    justify-content: space-between;
    gap: 0 calc(2 * var(--_space));
  }
  .solute-name .formula {
    font-weight: 600;
  }
  .sentence-part,
  .solute-facts,
  .assumption {
    color: var(--_muted);
  }
  .solute-facts,
  .assumption {
    font-size: 0.8667em;
  }
  .solute-facts {
    display: flex;
    flex-wrap: wrap;
    gap: 0 calc(1.5 * var(--_space));
    align-items: baseline;
  }
  .solute-facts > span {
    white-space: nowrap;
  }
  .assumption {
    flex-basis: 100%;
  }
  .understood + .assumption {
    margin-block-start: calc(-1 * var(--_space));
  }
  .reading {
    display: grid;
    grid-template-columns: minmax(0, 1fr);
    gap: calc(1.5 * var(--_space)) calc(4 * var(--_space));
    align-items: center;
    padding-block: calc(1.5 * var(--_space));
    border-block: 1px solid var(--_line);
  }
  .value {
    line-height: 1.05;
    white-space: nowrap;
  }
  .symbol {
    font-size: 1.25em;
    color: var(--_muted);
  }
  .pH {
    font-size: 2.9em;
    font-weight: 300;
    letter-spacing: -0.02em;
  }
  .uncertainty {
    font-size: 1.1333em;
    color: var(--_muted);
  }
  .classification {
    display: flex;
    align-items: baseline;
    gap: calc(0.9 * var(--_space));
    margin-block-start: calc(0.75 * var(--_space));
    color: var(--_accent);
  }
  .classification svg {
    flex: none;
    transform: translateY(1px);
  }
  .classification strong {
    font-weight: 600;
  }
  .undecided {
    color: var(--_ink);
  }
  .shape {
    fill: var(--_accent);
    stroke: none;
  }
  .scale {
    padding-inline: 0.6em;
  }
  .scale svg {
    display: block;
    overflow: visible;
  }
  .rule,
  .tick,
  .pointer,
  .neutral-point {
    shape-rendering: crispEdges;
  }
  .rule,
  .tick {
    stroke: var(--_edge);
    stroke-width: 1;
    vector-effect: non-scaling-stroke;
  }
  .tick-label {
    fill: var(--_muted);
    font-size: 11px;
  }
  .neutral-point {
    stroke: var(--_ink);
    stroke-width: 1;
    stroke-dasharray: 2 2;
  }
  .band {
    fill: var(--_accent);
    opacity: 0.3;
  }
  .pointer {
    stroke: var(--_accent);
    stroke-width: 2;
  }
  line.other-air {
    stroke: var(--_accent);
    stroke-width: 1;
  }
  .other-air circle {
    fill: var(--_surface);
    stroke: var(--_accent);
    stroke-width: 1.5;
  }
  .conditions,
  .other-air-text {
    color: var(--_muted);
    font-size: 0.9333em;
  }
  .other-air-text {
    display: flex;
    align-items: baseline;
    gap: calc(0.9 * var(--_space));
    margin-block-start: calc(-0.75 * var(--_space));
  }
  .conditions {
    display: flex;
    flex-wrap: wrap;
    gap: 0 0.75em;
    padding-inline-start: 0.6em;
  }
  .neutral-text {
    padding-inline-start: 0.75em;
    border-inline-start: 1px dashed var(--_ink);
    white-space: nowrap;
  }
  .store {
    display: flex;
    flex-wrap: wrap;
    align-items: center;
    gap: var(--_space) calc(1.5 * var(--_space));
  }
  button {
    min-block-size: 2rem;
    padding: 0.2em 0.9em;
    border: 1px solid var(--_edge);
    border-radius: var(--solute-radius, 2px);
    background: transparent;
    color: inherit;
    font: inherit;
    cursor: pointer;
  }
  button:hover {
    border-color: var(--_ink);
    background: var(--_sunken);
  }
  button:disabled,
  button[aria-disabled='true'] {
    color: var(--_muted);
    border-style: dashed;
    background: transparent;
    cursor: default;
  }
  .store-state {
    font-size: 0.9333em;
  }
  .store-state.failed {
    color: var(--_danger);
  }
  @container (inline-size >= 33rem) {
    .reading {
      grid-template-columns: max-content minmax(0, 1fr);
    }
    .value-block {
      min-inline-size: 12.5rem;
    }
  }
  @container (inline-size < 19rem) {
    .card {
      padding-inline: calc(1.5 * var(--_space));
    }
    .pH {
      font-size: 2.4em;
    }
  }
`;

export const cardStyles = [frameStyles, readingStyles, cautionStyles, sectionStyles, mediaStyles];
