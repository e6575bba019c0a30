/** How long typing may rest before an answer is asked for, milliseconds. */
const debounce = 60;
/** A first answer that takes longer than this is given up for a newer design. */
const patience = 900;

/**
 * Decides when the newest design goes to the solver: never two at once, the newest always last. While a first answer is
 * being computed a newer design waits for it (so that dragging shows answers all the way), but not for long.
 */
export class AskPolicy {
  private timer: ReturnType<typeof setTimeout> | undefined;
  private waiting = false;
  private askedAt = 0;
  private busy = false;

  constructor(private readonly ask: () => void) {}

  /** A new design is there. */
  changed(): void {
    clearTimeout(this.timer);
    this.timer = setTimeout(() => this.due(), debounce);
  }

  /** While dragging, answers must come without waiting for a pause. */
  changedByDrag(): void {
    if (this.busy) this.waiting = true;
    else this.send();
    if (this.waiting && performance.now() - this.askedAt > patience) this.send();
  }

  /** The first answer is there, or there will be none. */
  answered(): void {
    this.busy = false;
    if (this.waiting) this.send();
  }

  /** Asks at once, whatever is going on. */
  send(): void {
    clearTimeout(this.timer);
    this.waiting = false;
    this.busy = true;
    this.askedAt = performance.now();
    this.ask();
  }

  private due(): void {
    const late = performance.now() - this.askedAt > patience;
    if (this.busy && !late) {
      this.waiting = true;
      this.timer = setTimeout(() => this.waiting && this.send(), patience);
    } else this.send();
  }
}
