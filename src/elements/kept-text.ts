/** Marks the one child that the card owns, also in a page that was saved and opened again. */
const MARK = 'data-solute-text';

/** Keeps the result as plain text among the card's children; an empty text takes the node away. */
export function keepText(host: Element, text: string): void {
  const [own, ...others] = [...host.children].filter((child) => child.hasAttribute(MARK));
  for (const other of others) other.remove();
  if (text === '') {
    own?.remove();
    return;
  }
  if (own) {
    if (own.textContent !== text) own.textContent = text;
    return;
  }
  const node = host.ownerDocument.createElement('span');
  node.setAttribute(MARK, '');
  node.textContent = text;
  host.append(node);
}
