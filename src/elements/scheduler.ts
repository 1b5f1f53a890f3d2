/**
 * One queue of work for all cards of a page. A single card is served in the microtask after its change; many cards
 * are served in slices, each a task of its own, so that no task blocks the page and none is joined to a frame.
 */

/** Milliseconds of work in one task. */
const SLICE = 8;
/** Slices between two frames: enough that drawing does not cost more than the work, few enough that the page moves. */
const SLICES_PER_FRAME = 3;
/** Milliseconds without a frame after which the page is taken to be in the background, where nobody waits for frames. */
const LONGEST_WAIT = 100;

type Work = () => void;

const queue: Work[] = [];
let first = 0;
/** What is left of the time that work may take in the present frame without a task of its own. */
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
    if (left <= 0) {
      requestFrame();
    } else if (!microtaskPending) {
      microtaskPending = true;
      queueMicrotask(() => {
        microtaskPending = false;
        const start = performance.now();
        runUntil(start + left);
        left -= performance.now() - start;
        requestFrame();
      });
    }
  });
}

function runUntil(end: number): void {
  while (first < queue.length && performance.now() < end) queue[first++]?.();
  if (first === queue.length) {
    queue.length = 0;
    first = 0;
  }
}

/** Slices that follow each other as tasks, then the next frame. */
function runSlices(number: number): void {
  runUntil(performance.now() + SLICE);
  if (first === queue.length) left = SLICE;
  else if (number > 1) afterTask(() => runSlices(number - 1));
  else requestFrame();
}

/** Asks for the next frame, after which work goes on; also when the queue is empty, so that the time of the microtask is renewed. */
function requestFrame(): void {
  if (framePending) return;
  framePending = true;
  let served = false;
  const serve = () => {
    if (served) return;
    served = true;
    framePending = false;
    if (first === queue.length) left = SLICE;
    else afterTask(() => runSlices(SLICES_PER_FRAME));
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
