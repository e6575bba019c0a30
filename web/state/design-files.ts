import { longestDesign, readDesign } from '../../src/design/check';
import { DesignError } from '../../src/errors';
import type { Workbench } from './workbench.svelte';

/** Faults shown of a file that cannot be opened; more than a person reads is of no use. */
const mostShown = 6;

/**
 * Opens a design file; a file that cannot be read leaves the design on the screen as it is.
 * @returns one sentence per fault, none where the file was opened
 */
export async function openDesignFile(bench: Workbench, file: File): Promise<string[]> {
  if (file.size > 4 * longestDesign)
    return [`${file.name} holds ${Math.round(file.size / 1e6)} MB; that is no design file.`];
  try {
    bench.open(readDesign(await file.text()), `Open ${file.name}`);
    return [];
  } catch (reason) {
    const faults =
      reason instanceof DesignError
        ? reason.faults.map((fault) => fault.message)
        : ['The file could not be read.'];
    const more = faults.length > mostShown ? [`and ${faults.length - mostShown} more.`] : [];
    return [`${file.name} was not opened; the present design stays.`, ...faults.slice(0, mostShown), ...more];
  }
}

const fileName = (title: string) =>
  `${
    title
      .replace(/[^\p{L}\p{N}]+/gu, '-')
      .replace(/^-|-$/g, '')
      .toLowerCase() || 'design'
  }.json`;

/** Hands the design to the person as a file. */
export function saveDesignFile(bench: Workbench): void {
  const address = URL.createObjectURL(
    new Blob([`${JSON.stringify(bench.design, null, 2)}\n`], { type: 'application/json' }),
  );
  const link = document.createElement('a');
  link.href = address;
  link.download = fileName(bench.design.title);
  link.click();
  setTimeout(() => URL.revokeObjectURL(address), 10_000);
  bench.markSaved();
}
