import { releaseProxy, wrap } from 'comlink';

import { Hand, HandBroken } from './hand';
import { createPool, type InversionPool } from './pool';
import { poolSize } from './pool-size';
import type { InversionApi } from './protocol';

/** A pool of inversion workers sized to this machine. Nothing is loaded before the first fit. */
export function startInversionPool(): InversionPool {
  return createPool({ size: poolSize(navigator.hardwareConcurrency), spawn: spawnWorker });
}

function spawnWorker(): Hand {
  const worker = new Worker(new URL('./inversion.worker.ts', import.meta.url), { type: 'module' });
  const api = wrap<InversionApi>(worker);
  const hand = new Hand(api, () => {
    worker.terminate();
    api[releaseProxy]();
  });
  worker.onerror = (event) => {
    event.preventDefault();
    const reason = event.message ? ` (${event.message})` : '';
    hand.fail(
      new HandBroken(
        `The fitting worker could not be loaded or broke off${reason}. Reload the page and fit again; your settings are in its address.`,
      ),
    );
  };
  worker.onmessageerror = () =>
    hand.fail(
      new HandBroken('The fitting worker sent something that could not be read. Fit again.'),
    );
  return hand;
}
