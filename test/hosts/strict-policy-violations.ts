/** What the browser refused on this page, for the test that holds the page in a frame. */
const violations: string[] = [];
document.addEventListener('securitypolicyviolation', ({ violatedDirective, sample }) => violations.push(`${violatedDirective} ${sample}`));
Object.assign(window, { violations });

export {};
