import type { Workbench } from './workbench.svelte';

/** Ctrl+Z and Ctrl+Shift+Z anywhere on the page, in a field too: a field's own undo would leave the answer behind. */
export function undoKey(event: KeyboardEvent, bench: Workbench): void {
  if (!(event.ctrlKey || event.metaKey) || event.altKey) return;
  const key = event.key.toLowerCase();
  const redo = (key === 'z' && event.shiftKey) || key === 'y';
  if (key !== 'z' && !redo) return;
  event.preventDefault();
  if (redo) bench.redo();
  else bench.undo();
}
