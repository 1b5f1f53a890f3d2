import type { CSSResult } from 'lit';

/**
 * A constructed style sheet belongs to the document that constructed it. An element that is moved to another
 * document, or first connected there, needs sheets of that document.
 */
const sheets = new WeakMap<Document, Map<readonly CSSResult[], CSSStyleSheet[]>>();

/** Gives the root the styles as sheets of the document it stands in now. */
export function adoptDocumentStyles(root: ShadowRoot, styles: readonly CSSResult[]): void {
  const { ownerDocument } = root;
  const view = ownerDocument.defaultView;
  // A document without a window shows nothing; the element comes by here again when it is adopted by one that does.
  if (!view) return;
  let known = sheets.get(ownerDocument);
  if (!known) sheets.set(ownerDocument, (known = new Map<readonly CSSResult[], CSSStyleSheet[]>()));
  let own = known.get(styles);
  if (!own) {
    own = styles.map(({ cssText }) => {
      const sheet = new view.CSSStyleSheet();
      sheet.replaceSync(cssText);
      return sheet;
    });
    known.set(styles, own);
  }
  root.adoptedStyleSheets = own;
}
