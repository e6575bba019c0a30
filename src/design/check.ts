import * as v from 'valibot';
import { DesignError, type Fault } from '../errors';
import { consistencyFaults } from './consistency';
import { given } from './field-note';
import { issueFaults } from './issue-faults';
import { designSchema, type Design } from './schema';
import { isGroup, type AnySchema } from './schema-walk';
import { shapeFaults } from './shape';
import { expandShorthand } from './shorthand';
import { longestDesign, sizeFault } from './size';
import { versionFault } from './version';

export { longestDesign } from './size';

/** No more sentences than a person can act on. */
const mostFaults = 40;

export type Checked = { ok: true; design: Design } | { ok: false; faults: Fault[] };

const refuse = (faults: readonly (Fault | null)[]): Checked => {
  const found = faults.filter((fault) => fault !== null);
  return {
    ok: false,
    faults: [...new Map(found.map((fault) => [fault.message, fault])).values()].slice(0, mostFaults),
  };
};

const notADesign = (message: string): Fault => ({ path: '', kind: 'not a design', message });

const liesIn = (path: string, group: string) => path === group || path.startsWith(`${group}.`);

/** Faults of build and of values together; a value inside a part of the wrong build is not judged. */
function schemaFaults(input: unknown): { design: Design } | { faults: Fault[] } {
  const schema = designSchema as unknown as AnySchema;
  const shape = shapeFaults(schema, input);
  const parsed = v.safeParse(designSchema, input);
  if (parsed.success && shape.length === 0) return { design: parsed.output };
  // Strange keys are all in `shape`; the library names only the first of each group.
  const values = (parsed.issues ?? [])
    .filter((issue) => !(issue.type === 'strict_object' && issue.expected === 'never'))
    .flatMap((issue) => issueFaults(schema, input, issue))
    .filter((fault) => !shape.some(({ path }) => liesIn(fault.path, path)));
  return { faults: [...shape, ...values] };
}

/**
 * Checks a parsed design file: size, version, build, units, ranges, names, and what must fit together.
 * @param input anything JSON can hold
 * @returns the design with defaults filled in, or one sentence per fault, each naming its field; never throws for
 *   what a person may have written
 */
export function checkDesign(input: unknown): Checked {
  if (!isGroup(input)) {
    const needed = 'a design is a JSON object with "format": "pump-ceiling/design"';
    return refuse([notADesign(`Got ${given(input)}; ${needed}.`)]);
  }
  const early = sizeFault(input) ?? versionFault(input);
  if (early) return refuse([early]);
  const read = schemaFaults(expandShorthand(input));
  if ('faults' in read) return refuse(read.faults);
  const faults = consistencyFaults(read.design);
  return faults.length > 0 ? refuse(faults) : { ok: true, design: read.design };
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text.replace(/^\uFEFF/, ''));
  } catch (reason) {
    // The reason quotes the file, which may be of any length and hold anything.
    const why =
      reason instanceof SyntaxError ? reason.message.replace(/[\p{Cc}\s]+/gu, ' ').slice(0, 120) : 'too deep';
    throw new DesignError([notADesign(`The file is not valid JSON (${why}); a design is a JSON object.`)]);
  }
}

/**
 * Reads the text of a design file.
 * @throws DesignError with every fault found, when the text is no JSON or no valid design
 */
export function readDesign(text: string): Design {
  if (text.length > longestDesign) {
    const most = `a design has at most ${longestDesign}`;
    throw new DesignError([notADesign(`The file holds ${text.length} characters; ${most}.`)]);
  }
  if (text.trim() === '')
    throw new DesignError([notADesign('The file is empty; a design is a JSON object.')]);
  const checked = checkDesign(parseJson(text));
  if (!checked.ok) throw new DesignError(checked.faults);
  return checked.design;
}
