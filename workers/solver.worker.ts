import * as Comlink from 'comlink';
import { checkDesign } from '../src/design/check';
import { answerSteps } from '../src/report/answer';
import type { Reply, SolverEndpoint } from './wire';

/** Work done between two looks at the message queue; short enough that a new request is heard within a frame. */
const sliceMilliseconds = 12;

let latest = 0;

const breathe = () =>
  new Promise<void>((resolve) => {
    const { port1, port2 } = new MessageChannel();
    port1.onmessage = () => {
      port1.close();
      resolve();
    };
    port2.postMessage(null);
  });

async function run(request: number, design: unknown, listen: (reply: Reply) => void): Promise<void> {
  const started = performance.now();
  const checked = checkDesign(design);
  if (!checked.ok) return listen({ kind: 'refused', request, faults: checked.faults });
  let slice = started;
  for (const step of answerSteps(checked.design)) {
    if (request !== latest) return listen({ kind: 'stopped', request });
    if (step.kind === 'answer')
      listen({
        kind: 'answer',
        request,
        answer: step.answer,
        final: step.final,
        milliseconds: performance.now() - started,
      });
    const now = performance.now();
    if (now - slice < sliceMilliseconds) continue;
    if (step.kind === 'progress') listen({ kind: 'progress', request, share: step.share, what: step.what });
    await breathe();
    slice = performance.now();
  }
}

const endpoint: SolverEndpoint = {
  async answer(request, design, listen) {
    latest = request;
    try {
      await run(request, design, listen);
    } catch (reason) {
      const message = reason instanceof Error ? `${reason.name}: ${reason.message}` : String(reason);
      listen({ kind: 'failed', request, message });
    }
  },
  stop() {
    latest = -1;
  },
  ping: () => Date.now(),
};

Comlink.expose(endpoint);
