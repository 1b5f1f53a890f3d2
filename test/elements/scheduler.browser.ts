import { expect } from '@open-wc/testing';
import { schedule } from '../../src/elements/scheduler.js';

function work(milliseconds: number): void {
  const end = performance.now() + milliseconds;
  while (performance.now() < end);
}

describe('the shared scheduler', () => {
  it('serves a single piece of work within the same task', async () => {
    await new Promise(requestAnimationFrame);
    await new Promise(requestAnimationFrame);
    let later = false;
    setTimeout(() => (later = true));
    await schedule(() => undefined);
    expect(later).to.equal(false);
  });

  it('cuts much work into slices with frames between, in order', async () => {
    const order: number[] = [];
    let frames = 0;
    let counting = true;
    const count = () => {
      frames++;
      if (counting) requestAnimationFrame(count);
    };
    requestAnimationFrame(count);
    await Promise.all(Array.from({ length: 20 }, (_, index) => schedule(() => {
      order.push(index);
      work(4);
    })));
    counting = false;
    expect(order).to.deep.equal(Array.from({ length: 20 }, (_, index) => index));
    expect(frames).to.be.greaterThan(2);
  });

  it('does no more than a slice in one task', async () => {
    // Microtasks run when the stack is empty: what begins between two of them ran in one go.
    const begins: number[] = [];
    let pauses = 0;
    await Promise.all(Array.from({ length: 12 }, () => schedule(() => {
      begins.push(pauses);
      queueMicrotask(() => pauses++);
      work(5);
    })));
    expect(begins).to.have.length(12);
    for (const begin of begins) expect(begins.filter((other) => other === begin).length).to.be.at.most(2);
  });

  it('hands a failure to whom it concerns and goes on', async () => {
    const failing = schedule(() => {
      throw new Error('in the work');
    });
    const next = schedule(() => 7);
    let reason: unknown;
    await failing.catch((error: unknown) => (reason = error));
    expect((reason as Error).message).to.equal('in the work');
    expect(await next).to.equal(7);
  });
});
