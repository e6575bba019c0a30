import type { Fault } from '../src/errors';
import type { Answer } from '../src/report/types';

/** What passes between the page and the solver's thread: plain data only. */
export type Reply =
  /** `final` is false while the band is still to come; the report then has null ends. */
  | { kind: 'answer'; request: number; answer: Answer; final: boolean; milliseconds: number }
  | { kind: 'progress'; request: number; share: number; what: string }
  | { kind: 'refused'; request: number; faults: Fault[] }
  | { kind: 'stopped'; request: number }
  | { kind: 'failed'; request: number; message: string };

export interface SolverEndpoint {
  /**
   * Answers a design; every reply goes through `listen`. A later call stops an earlier one at its next step.
   * @param design parsed JSON as the person has it, checked here
   */
  answer(request: number, design: unknown, listen: (reply: Reply) => void): Promise<void>;
  stop(): void;
  /** Answers at once where the thread is alive. */
  ping(): number;
}
