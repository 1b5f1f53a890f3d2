/**
 * Runs in the page: time from inserting the elements to the frame in which all of them stand, for cards and for inert
 * copies of the same DOM with the same style sheets, and the longest task of each.
 */
export async function measureCards(count) {
  const main = document.querySelector('main');
  const frame = () => new Promise((resolve) => requestAnimationFrame(() => setTimeout(resolve, 0)));
  const pause = (milliseconds) => new Promise((resolve) => setTimeout(resolve, milliseconds));
  const card = (index) => {
    const element = document.createElement('solute-card');
    element.setAttribute('solutes', `${(0.01 + index / 1e5).toFixed(5)} mol/L NH4Cl; 2.5 g/L Na2HPO4`);
    return element;
  };

  /** A shadow tree of its own with the children of another and its sheets, and nothing that runs. */
  const inertCopy = (original) => {
    const host = document.createElement('div');
    const root = host.attachShadow({ mode: 'open' });
    root.adoptedStyleSheets = original.adoptedStyleSheets;
    for (const child of original.childNodes) root.append(child.cloneNode(true));
    return host;
  };

  const measure = async (make, finished) => {
    let longest = 0;
    const observer = new PerformanceObserver((list) => {
      for (const entry of list.getEntries()) longest = Math.max(longest, entry.duration);
    });
    observer.observe({ entryTypes: ['longtask'] });
    await frame();
    const elements = Array.from({ length: count }, (_, index) => make(index));
    const start = performance.now();
    main.append(...elements);
    await finished(elements);
    main.getBoundingClientRect();
    await frame();
    const time = performance.now() - start;
    await pause(100);
    observer.disconnect();
    return { time, longest, elements };
  };

  // The first card defines styles and warms the engine up for both sides.
  const first = card(count);
  const predicted = new Promise((resolve) => first.addEventListener('solute-prediction', resolve, { once: true }));
  main.append(first);
  await predicted;
  await first.updateComplete;
  await frame();
  const original = first.shadowRoot;
  first.remove();

  const copies = await measure(() => inertCopy(original), () => Promise.resolve());
  main.replaceChildren();
  await pause(100);

  let standing = 0;
  const allPredicted = new Promise((resolve) => {
    main.addEventListener('solute-prediction', () => {
      standing++;
      if (standing === count) resolve();
    });
  });
  const cards = await measure(card, async (elements) => {
    await allPredicted;
    await Promise.all(elements.map((element) => element.updateComplete));
  });
  const missing = cards.elements.filter((element) => element.shadowRoot.childElementCount === 0).length;
  if (missing > 0) throw new Error(`${missing} cards stand empty`);
  return { cards: cards.time, copies: copies.time, longestCardTask: cards.longest, longestCopyTask: copies.longest };
}
