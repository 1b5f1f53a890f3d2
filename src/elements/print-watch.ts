/** Tells cards that their page goes to paper, where everything must be open. One set of listeners per window. */

export interface Printable {
  /** Must have changed the DOM when it returns: the page is laid out for paper right after. */
  printChanged(printing: boolean): void;
}

interface Watch {
  readonly cards: Set<Printable>;
  readonly end: AbortController;
  printing: boolean;
}

const watches = new WeakMap<Window, Watch>();

function startWatch(view: Window): Watch {
  const end = new AbortController();
  const paper = view.matchMedia('print');
  const watch: Watch = { cards: new Set(), end, printing: paper.matches };
  const change = (printing: boolean) => {
    if (printing === watch.printing) return;
    watch.printing = printing;
    for (const card of [...watch.cards]) card.printChanged(printing);
  };
  const { signal } = end;
  view.addEventListener('beforeprint', () => change(true), { signal });
  view.addEventListener('afterprint', () => change(false), { signal });
  paper.addEventListener('change', ({ matches }) => change(matches), { signal });
  watches.set(view, watch);
  return watch;
}

/** Returns whether the page is being printed now. */
export function watchPrint(view: Window, card: Printable): boolean {
  const watch = watches.get(view) ?? startWatch(view);
  watch.cards.add(card);
  return watch.printing;
}

/** The last card to leave takes the listeners with it. */
export function unwatchPrint(view: Window, card: Printable): void {
  const watch = watches.get(view);
  if (!watch) return;
  watch.cards.delete(card);
  if (watch.cards.size > 0) return;
  watch.end.abort();
  watches.delete(view);
}
