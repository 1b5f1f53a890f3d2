/**
 * One queue of work for all cards of a page. A single card is served in the microtask after its change; many cards
 * are served in slices, so that no task blocks the page.
 */

/** Milliseconds of work between two frames. */
const SLICE = 8;
/** Milliseconds without a frame after which the page is taken to be in the background, where nobody waits for frames. */
const LONGEST_WAIT = 100;

type Work = () => void;

const queue: Work[] = [];
let first = 0;
let left = SLICE;
let microtaskPending = false;
let framePending = false;
let framesStopped = false;

/** Runs the work soon; the promise settles with it. */
export function schedule<Result>(work: () => Result): Promise<Result> {
  return new Promise<Result>((resolve, reject) => {
    queue.push(() => {
      try {
        resolve(work());
      } catch (error) {
        reject(error instanceof Error ? error : new Error(String(error)));
      }
    });
    if (left > 0 && !microtaskPending) {
      microtaskPending = true;
      queueMicrotask(() => {
        microtaskPending = false;
        runSlice();
      });
    } else if (left <= 0) {
      requestFrame();
    }
  });
}

function runSlice(): void {
  const start = performance.now();
  while (first < queue.length && performance.now() - start < left) queue[first++]?.();
  left -= performance.now() - start;
  if (first === queue.length) {
    queue.length = 0;
    first = 0;
  }
  requestFrame();
}

/** Asks for the next frame, which brings a full slice; also when the queue is empty, so that the slice is renewed. */
function requestFrame(): void {
  if (framePending) return;
  framePending = true;
  let served = false;
  const serve = () => {
    if (served) return;
    served = true;
    framePending = false;
    left = SLICE;
    if (first < queue.length) runSlice();
  };
  let timer: ReturnType<typeof setTimeout> | undefined;
  if (framesStopped) {
    afterTask(serve);
  } else {
    timer = setTimeout(() => {
      framesStopped = true;
      serve();
    }, LONGEST_WAIT);
  }
  requestAnimationFrame(() => {
    framesStopped = false;
    clearTimeout(timer);
    serve();
  });
}

/** Timers of a page in the background are slowed down, messages are not. */
function afterTask(work: Work): void {
  const { port1, port2 } = new MessageChannel();
  port1.onmessage = () => {
    port1.close();
    work();
  };
  port2.postMessage(null);
}
