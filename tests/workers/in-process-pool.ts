import { Hand } from '@/workers/hand';
import { createPool, type InversionPool } from '@/workers/pool';
import type { InversionApi } from '@/workers/protocol';
import { createInversionService } from '@/workers/service';

/** A pool whose workers run in this thread; `around` may stand between the pool and a worker. */
export function inProcessPool(
  size: number,
  around: (api: InversionApi, index: number) => InversionApi = (api) => api,
): { pool: InversionPool; ended: number[] } {
  const ended: number[] = [];
  let spawned = 0;
  const pool = createPool({
    size,
    spawn: () => {
      const index = spawned++;
      return new Hand(around(createInversionService(), index), () => ended.push(index));
    },
  });
  return { pool, ended };
}
