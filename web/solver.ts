import { SolverClient, type SolverEvent } from '../workers/client';

/** The solver on its own thread, as the page uses it. */
export function startSolver(hear: (event: SolverEvent) => void): SolverClient {
  const create = () =>
    new Worker(new URL('../workers/solver.worker.ts', import.meta.url), { type: 'module' });
  return new SolverClient(create, hear);
}
