import { css } from 'lit';

/** Paper, forced colours, reduced motion and higher contrast. */
export const mediaStyles = css`
  @media (prefers-reduced-motion: reduce) {
    .card {
      transition: none;
    }
  }
  @media (prefers-contrast: more) {
    .card {
      --_muted: var(--_ink);
      --_line: var(--_ink);
      --_edge: var(--_ink);
    }
  }
  @media print {
    :host {
      content-visibility: visible;
      break-inside: avoid;
      margin-block: 8pt;
    }
    .card {
      --_ink: #000;
      --_muted: #333;
      --_surface: #fff;
      --_sunken: #fff;
      --_line: #888;
      --_edge: #444;
      --_accent: #000;
      --_acidic: #000;
      --_neutral: #000;
      --_basic: #000;
      --_danger: #000;
      --_warning: #000;
      color-scheme: only light;
      border-color: #444;
      font-size: 9.5pt;
      opacity: 1;
      break-inside: avoid;
      print-color-adjust: exact;
    }
    .chevron,
    .store button {
      display: none;
    }
    .store:not(:has(.stored)) {
      display: none;
    }
    .spectators .sentence,
    .solute-facts {
      color: #333;
    }
  }
  @media (forced-colors: active) {
    .card {
      --_ink: CanvasText;
      --_muted: CanvasText;
      --_surface: Canvas;
      --_sunken: Canvas;
      --_line: CanvasText;
      --_edge: CanvasText;
      --_accent: CanvasText;
      --_acidic: CanvasText;
      --_neutral: CanvasText;
      --_basic: CanvasText;
      --_danger: CanvasText;
      --_warning: CanvasText;
      --_focus: Highlight;
    }
    .band {
      fill: Highlight;
      opacity: 1;
    }
    button:disabled,
    button[aria-disabled='true'] {
      color: GrayText;
      border-color: GrayText;
    }
    .equation.decides {
      border-inline-start-color: Highlight;
    }
    .equation {
      border-inline-start-color: Canvas;
    }
  }
`;
