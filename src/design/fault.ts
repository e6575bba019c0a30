import type { Fault, FaultKind } from '../errors';
import { nearestName } from '../quantity';
import { given, listed } from './field-note';

/** A fault whose sentence stands after the path of its field. */
export const faultAt = (path: string, kind: FaultKind, sentence: string): Fault => ({
  path,
  kind,
  message: `${path}: ${sentence}`,
});

/** A name that is none of those that are known: `got "cheese"; did you mean "chess"? known are ...`. */
export function unknownName(
  path: string,
  name: string,
  known: readonly string[],
  near = nearestName(known, name),
) {
  const hint = near ? `did you mean "${near}"? ` : '';
  return faultAt(path, 'unknown name', `got ${given(name)}; ${hint}known are ${listed(known)}`);
}
