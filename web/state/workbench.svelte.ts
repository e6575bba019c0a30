import { createContext } from 'svelte';
import { checkDesign } from '../../src/design/check';
import { demoDesign } from '../../src/design/demo';
import { fieldsOf, valueAt, withValue, type Field } from '../../src/design/fields';
import type { Design } from '../../src/design/schema';
import type { Fault } from '../../src/errors';
import type { Answer, Report } from '../../src/report/types';
import type { SolverEvent } from '../../workers/client';
import { startSolver } from '../solver';
import { AskPolicy } from './ask-policy';
import { beginHistory, record, redone, undone, type History } from './history';

export type Status =
  | { phase: 'computing' | 'band'; share: number; what: string; restarted?: string }
  | { phase: 'done'; milliseconds: number; restarted?: string }
  | { phase: 'stopped' }
  | { phase: 'failed'; message: string };

/** A design with every default written out, so that each field has something to show. */
function opened(input: unknown): { design: Design } | { faults: readonly Fault[] } {
  const checked = checkDesign(input);
  return checked.ok ? { design: checked.design } : { faults: checked.faults };
}

/** The design being worked on, its history, and the answer to it. */
export class Workbench {
  /** What the person has typed, faults and all; nothing typed is ever dropped. */
  private history = $state.raw<History<Design>>(beginHistory(demoDesign as Design));
  private saved = $state.raw<Design | null>(null);
  private answeredDesign = $state.raw<Design | null>(null);
  private askedDesign: Design | null = null;
  private solverFaults = $state.raw<{ design: Design; faults: readonly Fault[] } | null>(null);

  answer = $state.raw<Answer | null>(null);
  /** The report as it was before the last change, so that its effect can be seen. */
  before = $state.raw<Report | null>(null);
  status = $state.raw<Status>({ phase: 'computing', share: 0, what: 'starting' });

  design = $derived(this.history.present.state);
  private checked = $derived(checkDesign(this.design));
  faults = $derived.by((): readonly Fault[] => {
    if (!this.checked.ok) return this.checked.faults;
    return this.solverFaults?.design === this.design ? this.solverFaults.faults : [];
  });
  /** True while the answer on the screen is that of an earlier design. */
  stale = $derived(this.answer !== null && this.answeredDesign !== this.design);
  changedSinceSaved = $derived(this.saved !== this.design);
  fields = $derived(fieldsOf(this.design));
  undoName = $derived(this.history.past.length > 0 ? this.history.present.name : null);
  redoName = $derived(this.history.future[0]?.name ?? null);

  private readonly policy = new AskPolicy(() => this.ask());
  private readonly solver = startSolver((event) => this.hear(event));

  constructor() {
    const start = opened(demoDesign);
    if ('design' in start) this.history = beginHistory(start.design);
    this.saved = this.design;
    this.policy.send();
  }

  /**
   * A step: the design becomes another one.
   * @param key steps with the same key in quick succession are undone together
   */
  change(next: Design, name: string, key = '', dragging = false): void {
    if (next === this.design) return;
    const joins = key !== '' && key === this.history.present.key;
    if (!joins && !this.stale) this.before = this.answer?.report ?? null;
    this.history = record(this.history, next, name, key, performance.now());
    this.request(dragging);
  }

  /** Sets one value. */
  set(path: string, value: unknown, name: string, dragging = false): void {
    this.change(withValue(this.design, path, value), name, `${path}${dragging ? ' drag' : ''}`, dragging);
  }

  /**
   * Takes what was typed into a field; a bare number is taken as a number where the field wants one.
   * @returns the value of the design that it led to, as text
   */
  enter(field: Field, text: string): string {
    const bare = text.trim() !== '' && Number.isFinite(Number(text));
    const empty = text.trim() === '' && field.optional;
    const value = empty ? undefined : field.kind === 'number' && bare ? Number(text) : text;
    this.set(field.path, value, field.note.label);
    return value === undefined ? '' : String(value);
  }

  undo(): void {
    this.history = undone(this.history);
    this.request(false);
  }

  redo(): void {
    this.history = redone(this.history);
    this.request(false);
  }

  /** Opens a design. @returns its faults where it cannot be opened; the present one then stays */
  open(input: unknown, name: string): readonly Fault[] {
    const next = opened(input);
    if ('faults' in next) return next.faults;
    this.change(next.design, name);
    this.before = null;
    this.saved = next.design;
    return [];
  }

  markSaved(): void {
    this.saved = this.design;
  }

  stop(): void {
    this.solver.stop();
  }

  retry(): void {
    this.policy.send();
  }

  /** The solver's thread, for the browser test that ends it. */
  get thread(): Worker | null {
    return this.solver.thread;
  }

  faultAt(path: string): Fault | undefined {
    return this.faults.find((fault) => fault.path === path);
  }

  /** Whether a value is another one than in the file last opened or saved. */
  differsFromSaved(path: string): boolean {
    return (
      this.saved !== null &&
      this.saved !== this.design &&
      valueAt(this.saved, path) !== valueAt(this.design, path)
    );
  }

  private request(dragging: boolean): void {
    if (!this.checked.ok) return;
    if (dragging) this.policy.changedByDrag();
    else this.policy.changed();
  }

  private ask(): void {
    if (!this.checked.ok) return;
    this.askedDesign = this.design;
    this.status = { phase: 'computing', share: 0, what: 'operating point' };
    this.solver.ask($state.snapshot(this.design));
  }

  private hear(event: SolverEvent): void {
    const restarted = 'restarted' in this.status ? this.status.restarted : undefined;
    if (event.kind === 'progress') {
      const phase = this.status.phase === 'band' ? 'band' : 'computing';
      this.status = { phase, share: event.share, what: event.what, restarted };
    } else if (event.kind === 'answer') {
      this.answer = event.answer;
      this.answeredDesign = this.askedDesign;
      this.status = event.final
        ? { phase: 'done', milliseconds: event.milliseconds, restarted }
        : { phase: 'band', share: 0, what: 'band', restarted };
    } else if (event.kind === 'restarted') {
      this.status = { phase: 'computing', share: 0, what: 'restarted', restarted: event.message };
      return;
    } else if (event.kind === 'refused') {
      this.solverFaults = this.askedDesign && { design: this.askedDesign, faults: event.faults };
      this.status = { phase: 'stopped' };
    } else if (event.kind === 'failed') this.status = { phase: 'failed', message: event.message };
    else this.status = { phase: 'stopped' };
    if (event.kind !== 'progress') this.policy.answered();
  }
}

export const [useWorkbench, provideWorkbench] = createContext<Workbench>();
