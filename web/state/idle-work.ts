/**
 * Drawing that nobody looks at just now: done one piece at a time when the page has nothing better to do, so that a drag
 * never waits for a chart below the fold. A newer piece for the same owner replaces the older one.
 */
const waiting = new Map<object, () => void>();
let scheduled = false;

const whenIdle = (work: () => void): void => {
  if ('requestIdleCallback' in globalThis) requestIdleCallback(work, { timeout: 1500 });
  else setTimeout(work, 50);
};

function next(): void {
  const [first] = waiting;
  scheduled = false;
  if (!first) return;
  const [owner, work] = first;
  waiting.delete(owner);
  work();
  if (waiting.size > 0) schedule();
}

function schedule(): void {
  if (scheduled) return;
  scheduled = true;
  whenIdle(next);
}

function workLater(owner: object, work: () => void): void {
  waiting.delete(owner);
  waiting.set(owner, work);
  schedule();
}

function forgetWork(owner: object): void {
  waiting.delete(owner);
}

/** Work of one drawing: at once while it is on the screen, when idle while it is not. */
export class SeenWork {
  private seen = true;
  private readonly observer: IntersectionObserver;
  private pending: (() => void) | null = null;

  constructor(element: Element) {
    this.observer = new IntersectionObserver(
      (entries) => {
        this.seen = entries.at(-1)?.isIntersecting ?? true;
        if (this.seen) this.flush();
      },
      { rootMargin: '200px' },
    );
    this.observer.observe(element);
  }

  do(work: () => void): void {
    this.pending = work;
    if (this.seen) this.flush();
    else workLater(this, () => this.flush());
  }

  end(): void {
    this.pending = null;
    forgetWork(this);
    this.observer.disconnect();
  }

  private flush(): void {
    forgetWork(this);
    const work = this.pending;
    this.pending = null;
    work?.();
  }
}
