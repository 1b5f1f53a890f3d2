import { css } from 'lit';

/** Cautions, problems, notes and the empty state. */
export const cautionStyles = css`
  .cautions {
    display: grid;
    row-gap: calc(1.25 * var(--_space));
  }
  .caution {
    display: grid;
    grid-template-columns: auto minmax(0, 1fr);
    column-gap: calc(1.25 * var(--_space));
    --_gravity: var(--_muted);
  }
  .caution.danger {
    --_gravity: var(--_danger);
  }
  .caution.warning,
  .state-title {
    --_gravity: var(--_warning);
  }
  .caution strong {
    color: var(--_gravity);
    font-weight: 600;
  }
  .doubt {
    display: flex;
    flex-basis: 100%;
    align-items: flex-start;
    gap: var(--_space);
    margin-block-start: calc(0.5 * var(--_space));
    --_gravity: var(--_warning);
  }
  .doubt .icon {
    flex: none;
  }
  .doubt strong {
    color: var(--_warning);
    font-weight: 600;
  }
  .restored {
    padding: var(--_space) calc(1.5 * var(--_space));
    border: 1px solid var(--_line);
  }
  .icon {
    display: block;
    margin-block-start: 0.18em;
    fill: none;
    stroke: var(--_gravity, var(--_muted));
    stroke-width: 1.4;
    stroke-linejoin: round;
  }
  .caution.danger .icon > path:first-child {
    fill: var(--_danger);
  }
  .caution.danger .icon .sign {
    stroke: var(--_surface);
  }
  .sign {
    stroke-width: 1.8;
  }
  .state-title {
    display: flex;
    align-items: flex-start;
    gap: calc(1.25 * var(--_space));
  }
  .state-title strong {
    font-weight: 600;
  }
  .empty,
  .problems,
  .problems > ul {
    display: grid;
    row-gap: calc(1.25 * var(--_space));
  }
  .empty .icon {
    stroke: var(--_muted);
    stroke-dasharray: 2.5 2;
  }
  .typed {
    font-family: ui-monospace, 'SF Mono', 'Cascadia Mono', 'Liberation Mono', 'DejaVu Sans Mono', monospace;
    font-size: 0.9333em;
  }
  .as-typed {
    display: grid;
    row-gap: 0.2em;
    padding: calc(1.25 * var(--_space)) calc(1.5 * var(--_space));
    background: var(--_sunken);
  }
  .as-typed .typed {
    white-space: pre-wrap;
  }
  mark {
    padding-inline: 0.1em;
    background: transparent;
    color: inherit;
    font-weight: 700;
    text-decoration: underline wavy var(--_warning) 1px;
    text-underline-offset: 0.3em;
    text-decoration-skip-ink: none;
  }
  .suggestions-title {
    margin-block-start: calc(0.75 * var(--_space));
    color: var(--_muted);
    font-size: 0.8667em;
  }
  .suggestions > li {
    padding-inline-start: calc(1.5 * var(--_space));
    border-inline-start: 1px solid var(--_line);
  }
  .notes {
    display: grid;
    row-gap: 0.25em;
    padding: var(--_space) calc(1.5 * var(--_space));
    border: 1px dashed var(--_warning);
    font-size: 0.9333em;
  }
`;
