// Asks the browser to keep the page's files, where it can: on https and on this machine.

/** Written by the build beside the page. */
const SCRIPT = './offline.js';

/** What goes wrong here takes nothing from a page that is open. */
export function keepOffline(): void {
  if (!isSecureContext || !('serviceWorker' in navigator) || location.protocol === 'file:') return;
  navigator.serviceWorker.register(SCRIPT).catch(() => {});
}
