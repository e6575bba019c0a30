import type { Fault } from '../errors';
import { given } from './field-note';
import { under } from './schema-walk';

const currentVersion = 1;

/**
 * Whether a file is a design of the version this program reads. Looked at first, so that another kind of file, or one
 * of a later program, gives one sentence and not a list of all it lacks.
 *
 * The place for older versions: there is none yet. When the shape of the file changes, the version goes up by one and
 * a function that turns version n into n + 1 is called here, before the schema sees the file.
 */
export function versionFault(input: unknown): Fault | null {
  const format = under(input, 'format');
  const version = under(input, 'version');
  if (format !== 'pump-ceiling/design')
    return {
      path: 'format',
      kind: 'not a design',
      message: `format: got ${given(format)}; "pump-ceiling/design" is needed`,
    };
  if (version === currentVersion) return null;
  const later =
    typeof version === 'number' && version > currentVersion ? '; a later program wrote this file' : '';
  const message = `version: got ${given(version)}; version ${currentVersion} is read${later}`;
  return { path: 'version', kind: 'unsupported version', message };
}
