import * as v from 'valibot';
import { DesignError, type Fault, type FaultKind } from '../errors';
import { nearestName } from '../quantity';
import { consistencyFaults } from './consistency';
import { designSchema, type Design } from './schema';

/** Longest design text that is read; far beyond any real design. */
export const longestDesign = 2_000_000;
/** No more sentences than a person can act on. */
const mostFaults = 40;

export type Checked = { ok: true; design: Design } | { ok: false; faults: Fault[] };

type Issue = v.BaseIssue<unknown>;

const pathOf = (issue: Issue): string => (issue.path ?? []).map((item) => String(item.key)).join('.');
const kinds = new Set<string>([
  'missing', 'unknown key', 'wrong type', 'not a quantity', 'wrong dimension', 'unknown unit', 'ambiguous unit',
  'out of range', 'unknown name', 'inconsistent', 'not a design', 'unsupported version',
] satisfies FaultKind[]);

const short = (text: string) => (text.length > 60 ? `${text.slice(0, 57)}...` : text);

function faultOf(issue: Issue): Fault {
  const path = pathOf(issue);
  if (issue.type === 'strict_object' && issue.expected === 'never') {
    const parent = issue.path?.at(-1)?.input as object | undefined;
    const near = nearestName(knownKeys(issue, parent), path.split('.').at(-1) ?? '');
    const hint = near ? `; did you mean "${near}"?` : '';
    return { path, kind: 'unknown key', message: `${short(path)}: this key is not known${hint}` };
  }
  if (issue.type === 'strict_object' && issue.input === undefined)
    return { path, kind: 'missing', message: `${path}: this value is missing and has no default` };
  const [kind, ...rest] = issue.message.split('|');
  if (kinds.has(kind!) && rest.length > 0)
    return { path, kind: kind as FaultKind, message: `${path}: ${rest.join('|')}` };
  const received = short(issue.received);
  const wanted = issue.expected ? short(issue.expected) : 'another kind of value';
  return { path, kind: 'wrong type', message: `${path}: got ${received}; ${wanted} is needed` };
}

type Entries = { entries?: Record<string, unknown>; wrapped?: unknown; options?: unknown[]; item?: unknown; items?: unknown[] };

/** Keys allowed where the issue arose, found by walking the schema along the issue's path. */
function knownKeys(issue: Issue, parent: object | undefined): string[] {
  let at: unknown[] = [designSchema];
  const flat = (schema: unknown): unknown[] => {
    const shape = schema as Entries;
    if (shape.wrapped) return flat(shape.wrapped);
    return shape.options && !('entries' in shape) ? shape.options.flatMap(flat) : [schema];
  };
  for (const item of (issue.path ?? []).slice(0, -1))
    at = at.flatMap(flat).flatMap((schema) => {
      const shape = schema as Entries;
      const below = shape.entries?.[String(item.key)] ?? shape.item ?? shape.items?.[Number(item.key)];
      return below ? [below] : [];
    });
  const used = new Set(Object.keys(parent ?? {}));
  return at.flatMap(flat).flatMap((schema) => Object.keys((schema as Entries).entries ?? {})).filter((key) => !used.has(key));
}

/**
 * Checks a parsed design file: shape, units, ranges, names, and what must fit together.
 * @param input anything JSON can hold
 * @returns the design with defaults filled in, or one sentence per fault, each naming its field
 */
export function checkDesign(input: unknown): Checked {
  if (typeof input !== 'object' || input === null || Array.isArray(input)) {
    const got = Array.isArray(input) ? 'a list' : input === null ? 'null' : `a ${typeof input}`;
    return { ok: false, faults: [{ path: '', kind: 'not a design', message: `This is ${got}, not a design: a JSON object with "format": "pump-ceiling/design" is needed.` }] };
  }
  const parsed = v.safeParse(designSchema, input);
  if (!parsed.success) return { ok: false, faults: unique(parsed.issues.map(faultOf)).slice(0, mostFaults) };
  const faults = consistencyFaults(parsed.output);
  return faults.length > 0 ? { ok: false, faults: faults.slice(0, mostFaults) } : { ok: true, design: parsed.output };
}

const unique = (faults: Fault[]) => [...new Map(faults.map((fault) => [fault.message, fault])).values()];

/**
 * Reads the text of a design file.
 * @throws DesignError with every fault found, when the text is no JSON or no valid design
 */
export function readDesign(text: string): Design {
  const refuse = (message: string): never => {
    throw new DesignError([{ path: '', kind: 'not a design', message }]);
  };
  if (text.length > longestDesign)
    refuse(`The file holds ${Math.round(text.length / 1e6)} million characters; a design has at most ${longestDesign / 1e6} million.`);
  if (text.trim() === '') refuse('The file is empty; a design is a JSON object.');
  let parsed: unknown;
  try {
    parsed = JSON.parse(text.replace(/^\uFEFF/, ''));
  } catch (reason) {
    refuse(`The file is not valid JSON (${short((reason as Error).message.replace(/\s+/g, ' '))}); a design is a JSON object.`);
  }
  const checked = checkDesign(parsed);
  if (!checked.ok) throw new DesignError(checked.faults);
  return checked.design;
}
