import type * as v from 'valibot';
import type { Fault, FaultKind } from '../errors';
import { dimensionRecord } from '../quantity';
import { exampleOf, given, listed, wordsOf, type FieldNote } from './field-note';
import { isGroup, isList, itemAt, noteOf, settled, under, unwrapped, type AnySchema } from './schema-walk';

type Issue = v.BaseIssue<unknown>;
type Key = string | number;

const packedKinds: ReadonlySet<string> = new Set<FaultKind>([
  'wrong type',
  'not a quantity',
  'wrong dimension',
  'unknown unit',
  'ambiguous unit',
  'out of range',
  'unknown name',
  'inconsistent',
]);

/** What a field takes, in words: `a length, such as "3 mm"`. */
function wantedBy(note: FieldNote): string {
  if (note.choices) return `one of ${listed(note.choices.map((word) => `"${word}"`))}`;
  if (!note.dimension) return 'text';
  return `${dimensionRecord(note.dimension).label}, such as "${exampleOf(note)}"${wordsOf(note)}`;
}

/** The schema at the end of a path that leads to something missing. */
function schemaAt(
  schema: AnySchema,
  value: unknown,
  [key, ...further]: readonly Key[],
): AnySchema | undefined {
  if (key === undefined) return schema;
  const inner = settled(schema, value);
  const below = inner?.entries?.[key] ?? (inner && isList(inner) ? itemAt(inner, Number(key)) : undefined);
  return below && schemaAt(below, under(value, key), further);
}

function missing(root: AnySchema, input: unknown, keys: readonly Key[]): Fault {
  const path = keys.join('.');
  const schema = schemaAt(root, input, keys);
  const inner = schema && unwrapped(schema);
  const note = inner && noteOf(inner);
  let wanted = inner?.type === 'array' ? 'a list' : 'a value';
  if (note) wanted = wantedBy(note);
  else if (inner?.entries) wanted = `a group in { } with ${listed(Object.keys(inner.entries))}`;
  return { path, kind: 'missing', message: `${path}: missing; needed: ${wanted}` };
}

/** Issues of the shape a union's value was meant to have: a group is judged as the group, not as the word it is not. */
function innerIssues(issue: Issue): readonly Issue[] {
  const isUnionOfGroup = issue.type === 'union' && isGroup(issue.input);
  return isUnionOfGroup ? (issue.issues ?? []).filter((inner) => inner.path !== undefined) : [];
}

/**
 * Turns what the schema library found into faults, one sentence each.
 * @param root schema and input that the issue's path starts from
 * @param before keys that lead to where the issue arose
 */
export function issueFaults(
  root: AnySchema,
  input: unknown,
  issue: Issue,
  before: readonly Key[] = [],
): Fault[] {
  const keys = [...before, ...(issue.path ?? []).map((item) => item.key as Key)];
  const inner = innerIssues(issue);
  if (inner.length > 0) return inner.flatMap((one) => issueFaults(root, input, one, keys));
  const absent = issue.type === 'strict_object' && issue.input === undefined;
  if (absent) return [missing(root, input, keys)];
  const path = keys.join('.');
  const [kind = '', ...rest] = issue.message.split('|');
  if (packedKinds.has(kind) && rest.length > 0)
    return [{ path, kind: kind as FaultKind, message: `${path}: ${rest.join('|')}` }];
  return [
    {
      path,
      kind: 'wrong type',
      message: `${path}: got ${given(issue.input)}; this is not what is read here`,
    },
  ];
}
