import * as Comlink from 'comlink';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { SolverClient, type SolverEvent } from '../../workers/client';
import type { Reply, SolverEndpoint } from '../../workers/wire';

type Answering = (request: number, design: unknown, listen: (reply: Reply) => void) => Promise<void>;

/** A thread made of a message channel, whose answers a test decides and which can die. */
class FakeThread extends EventTarget {
  private readonly channel = new MessageChannel();
  terminated = false;

  constructor(answer: Answering) {
    super();
    const endpoint: SolverEndpoint = { answer, stop: () => undefined, ping: () => 1 };
    Comlink.expose(endpoint, this.channel.port2 as unknown as Comlink.Endpoint);
    this.channel.port1.addEventListener('message', (event) => {
      if (!this.terminated)
        this.dispatchEvent(new MessageEvent('message', { data: event.data, ports: [...event.ports] }));
    });
    this.channel.port1.start();
    this.channel.port2.start();
  }
  postMessage(message: unknown, transfer: Transferable[] = []): void {
    if (!this.terminated) this.channel.port1.postMessage(message, transfer);
  }
  terminate(): void {
    this.terminated = true;
    this.channel.port1.close();
    this.channel.port2.close();
  }
  die(): void {
    this.dispatchEvent(Object.assign(new Event('error', { cancelable: true }), { message: 'out of memory' }));
  }
}

const progress = (request: number): Reply => ({ kind: 'progress', request, share: 0.5, what: 'sweep' });
const stopped = (request: number): Reply => ({ kind: 'stopped', request });
const never: Answering = () => new Promise(() => undefined);

describe('the page side of the solver', () => {
  const threads: FakeThread[] = [];
  const events: SolverEvent[] = [];
  let client: SolverClient;

  const start = (...answers: Answering[]) => {
    client = new SolverClient(
      () => {
        const thread = new FakeThread(answers[Math.min(threads.length, answers.length - 1)]!);
        threads.push(thread);
        return thread as unknown as Worker;
      },
      (event) => events.push(event),
    );
  };
  const settled = (count: number) => vi.waitFor(() => expect(events.length).toBeGreaterThanOrEqual(count));

  beforeEach(() => {
    threads.length = 0;
    events.length = 0;
  });
  afterEach(() => {
    client.close();
    threads.forEach((thread) => thread.terminate());
    vi.useRealTimers();
  });

  it('passes on what the thread says of the request', async () => {
    start(async (request, _design, listen) => {
      listen(progress(request));
      listen({ kind: 'refused', request, faults: [] });
    });
    const request = client.ask({});
    await settled(2);
    expect(events.map((event) => [event.kind, event.request])).toEqual([
      ['progress', request],
      ['refused', request],
    ]);
  });

  it('lets only the latest request be heard', async () => {
    start(async (request, design, listen) => {
      if (design === 'slow') await new Promise((resolve) => setTimeout(resolve, 30));
      listen(stopped(request));
    });
    client.ask('slow');
    const second = client.ask('fast');
    await settled(1);
    await new Promise((resolve) => setTimeout(resolve, 60));
    expect(events.map((event) => event.request)).toEqual([second]);
  });

  it('starts a new thread when one dies, asks it the same and says so', async () => {
    const designs: unknown[] = [];
    start(never, async (request, design, listen) => {
      designs.push(design);
      listen(stopped(request));
    });
    const request = client.ask({ title: 'kept' });
    threads[0]!.die();
    await settled(2);
    expect(events[0]).toMatchObject({ kind: 'restarted', request });
    expect(events[1]).toMatchObject({ kind: 'stopped', request });
    expect(threads).toHaveLength(2);
    expect(threads[0]!.terminated).toBe(true);
    expect(designs).toEqual([{ title: 'kept' }]);
  });

  it('gives up in words when the thread dies again and again', async () => {
    start(never);
    client.ask({});
    for (let death = 0; death < 3; death++) threads.at(-1)!.die();
    await settled(3);
    expect(events.map((event) => event.kind)).toEqual(['restarted', 'restarted', 'failed']);
    expect(events[2]).toMatchObject({ message: expect.stringContaining('given up') });
  });

  it('takes silence for a hang', async () => {
    vi.useFakeTimers();
    start(never);
    client.ask({});
    vi.advanceTimersByTime(21_000);
    expect(events[0]).toMatchObject({
      kind: 'restarted',
      message: expect.stringContaining('no sign of life'),
    });
  });

  it('leaves an idle thread that dies alone until it is needed', async () => {
    start(async (request, _design, listen) => listen(stopped(request)));
    client.ask({});
    await settled(1);
    threads[0]!.die();
    expect(events).toHaveLength(1);
    client.ask({});
    await settled(2);
    expect(threads).toHaveLength(2);
  });
});
