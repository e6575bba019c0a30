import type { Workbench } from './workbench.svelte';

declare global {
  interface Window {
    pumpCeiling?: { endWorker: () => void };
  }
}

/** With ?test=1 in the address a browser test may end the solver's thread, to see the page recover. */
export function offerTestHandle(bench: Workbench): void {
  if (!new URLSearchParams(location.search).has('test')) return;
  window.pumpCeiling = { endWorker: () => bench.thread?.dispatchEvent(new ErrorEvent('error')) };
}
