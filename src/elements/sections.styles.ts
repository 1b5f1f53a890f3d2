import { css } from 'lit';

/** Equations, composition and constants. */
export const sectionStyles = css`
  .sections {
    margin-block-end: calc(-1 * var(--_space));
    border-block-start: 1px solid var(--_line);
  }
  .section + .section {
    border-block-start: 1px solid var(--_line);
  }
  .summary {
    display: flex;
    align-items: baseline;
    gap: calc(1.25 * var(--_space));
    inline-size: 100%;
    min-block-size: 2.25rem;
    padding: calc(0.9 * var(--_space)) 0;
    border: 0;
    border-radius: 0;
    text-align: start;
  }
  .chevron {
    flex: none;
    inline-size: 0.5em;
    block-size: 0.5em;
    border: solid var(--_muted);
    border-width: 0 1.5px 1.5px 0;
    transform: translateY(-0.1em) rotate(-45deg);
  }
  .chevron:dir(rtl) {
    transform: translateY(-0.1em) rotate(135deg);
  }
  [aria-expanded='true'] > .chevron {
    transform: translateY(-0.2em) rotate(45deg);
  }
  .count {
    margin-inline-start: auto;
    color: var(--_muted);
    font-size: 0.8667em;
  }
  .section-content {
    display: grid;
    grid-template-columns: minmax(0, 1fr);
    row-gap: var(--_space);
    padding-block: calc(0.5 * var(--_space)) calc(2 * var(--_space));
  }
  .section-content[hidden] {
    display: none;
  }
  .group-title {
    color: var(--_muted);
    font-size: 0.8667em;
  }
  .equations,
  .spectators {
    display: grid;
    row-gap: calc(0.9 * var(--_space));
    margin-block-end: var(--_space);
  }
  .equation {
    position: relative;
    display: flex;
    flex-wrap: wrap;
    align-items: baseline;
    justify-content: space-between;
    gap: 0 calc(2 * var(--_space));
    padding-inline-start: calc(1.5 * var(--_space));
    border-inline-start: 2px solid transparent;
  }
  .equation.decides {
    border-inline-start-color: var(--_accent);
  }
  .reaction {
    font-size: 1.0667em;
  }
  .arrow {
    margin-inline: 0.15em;
  }
  .reaction-facts {
    display: flex;
    flex-wrap: wrap;
    gap: 0 calc(1.5 * var(--_space));
    color: var(--_muted);
    font-size: 0.8667em;
  }
  .fact.constant {
    white-space: normal;
  }
  .logarithm {
    white-space: nowrap;
  }
  .decides-mark {
    color: var(--_accent);
    font-weight: 600;
  }
  .spectators > li {
    display: grid;
    grid-template-columns: minmax(4em, auto) minmax(0, 1fr);
    column-gap: calc(1.5 * var(--_space));
    padding-inline-start: calc(1.75 * var(--_space));
  }
  .figures {
    display: grid;
    grid-template-columns: repeat(auto-fit, minmax(min(100%, 16rem), 1fr));
    gap: 0.15em calc(4 * var(--_space));
    font-size: 0.9333em;
  }
  .figures > div {
    display: flex;
    justify-content: space-between;
    gap: var(--_space);
  }
  dt {
    color: var(--_muted);
  }
  table {
    inline-size: 100%;
    margin-block-start: var(--_space);
    border-collapse: collapse;
    font-size: 0.9333em;
  }
  caption {
    padding-block: calc(0.5 * var(--_space));
    color: var(--_muted);
    text-align: start;
  }
  th,
  td {
    padding: 0.3em 0;
    border-block-end: 1px solid var(--_line);
    font-weight: 400;
    text-align: start;
    vertical-align: baseline;
  }
  th + th,
  th + td,
  td + td {
    padding-inline-start: calc(1.5 * var(--_space));
  }
  table .formula {
    white-space: normal;
  }
  thead th {
    border-block-end-color: var(--_edge);
    color: var(--_muted);
    font-size: 0.9286em;
    vertical-align: bottom;
  }
  .number {
    text-align: end;
    white-space: nowrap;
  }
  tbody .sentence,
  tbody .origin {
    display: block;
  }
  td .origin {
    white-space: normal;
  }
  .quantity {
    color: var(--_muted);
  }
  .spectators .sentence {
    color: var(--_muted);
    font-size: 0.9333em;
  }
  @container (inline-size < 22rem) {
    table {
      font-size: 0.8333em;
    }
    th + th,
    th + td,
    td + td {
      padding-inline-start: var(--_space);
    }
    .spectators > li {
      grid-template-columns: minmax(0, 1fr);
    }
  }
  @container (inline-size < 18rem) {
    .number {
      white-space: normal;
    }
    th + th,
    th + td,
    td + td {
      padding-inline-start: calc(0.6 * var(--_space));
    }
  }
`;
