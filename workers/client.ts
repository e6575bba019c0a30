import * as Comlink from 'comlink';
import type { Reply, SolverEndpoint } from './wire';

/** What the page hears; `restarted` says that the solver's thread died or hung and a new one took the request up. */
export type SolverEvent = Reply | { kind: 'restarted'; request: number; message: string };

/** A request that has shown no sign of life for this long is taken as hung. */
const silence = 20_000;
/** Restarts in a row for one and the same request before it is given up. */
const mostRestarts = 2;

/**
 * The page's side of the solver: the latest request wins, a crash or hang restarts the thread and asks again.
 * @param create makes a new worker
 * @param hear receives every event that belongs to the latest request
 */
export class SolverClient {
  private worker: Worker | null = null;
  private endpoint: Comlink.Remote<SolverEndpoint> | null = null;
  private request = 0;
  private design: unknown;
  private busy = false;
  private restarts = 0;
  private timer: ReturnType<typeof setTimeout> | undefined;

  constructor(
    private readonly create: () => Worker,
    private readonly hear: (event: SolverEvent) => void,
  ) {}

  /** Asks for an answer; a request still running is stopped. @returns the number its events carry */
  ask(design: unknown): number {
    this.request += 1;
    this.design = design;
    this.restarts = 0;
    this.send();
    return this.request;
  }

  /** Stops what is running; the last answer stands. */
  stop(): void {
    void this.endpoint?.stop();
  }

  /** Ends the thread for good. */
  close(): void {
    clearTimeout(this.timer);
    this.drop();
  }

  /** The running worker, so that a test can end it. */
  get thread(): Worker | null {
    return this.worker;
  }

  private drop(): void {
    this.worker?.terminate();
    this.worker = null;
    this.endpoint = null;
  }

  private start(): Comlink.Remote<SolverEndpoint> {
    const worker = this.create();
    worker.addEventListener('error', (event) => {
      event.preventDefault();
      if (worker === this.worker)
        this.recover(`The solver stopped unexpectedly${event.message ? ` (${event.message})` : ''}`);
    });
    worker.addEventListener('messageerror', () => {
      if (worker === this.worker) this.recover('The solver sent something that could not be read');
    });
    this.worker = worker;
    this.endpoint = Comlink.wrap<SolverEndpoint>(worker);
    return this.endpoint;
  }

  private send(): void {
    const request = this.request;
    const endpoint = this.endpoint ?? this.start();
    this.busy = true;
    this.watch();
    const listen = (reply: Reply) => {
      if (reply.request !== this.request) return;
      this.watch();
      if (reply.kind !== 'progress' && !(reply.kind === 'answer' && !reply.final)) this.settle();
      this.hear(reply);
    };
    endpoint.answer(request, this.design, Comlink.proxy(listen)).catch((reason: unknown) => {
      if (request !== this.request) return;
      this.settle();
      this.hear({
        kind: 'failed',
        request,
        message: reason instanceof Error ? reason.message : String(reason),
      });
    });
  }

  private settle(): void {
    this.busy = false;
    clearTimeout(this.timer);
  }

  private watch(): void {
    clearTimeout(this.timer);
    this.timer = setTimeout(() => {
      if (this.busy) this.recover('The solver gave no sign of life');
    }, silence);
  }

  private recover(message: string): void {
    this.drop();
    clearTimeout(this.timer);
    if (!this.busy) return;
    this.restarts += 1;
    if (this.restarts > mostRestarts) {
      this.busy = false;
      this.hear({
        kind: 'failed',
        request: this.request,
        message: `${message}; it was given up after ${mostRestarts} restarts`,
      });
      return;
    }
    this.hear({ kind: 'restarted', request: this.request, message: `${message}; it was restarted` });
    this.send();
  }
}
