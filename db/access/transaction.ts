import type { Context, Handle } from './context';

/** All or nothing. Inside, only `tx` may write: the queue refuses any other write at once. */
export function transaction<T>(ctx: Context, work: (tx: Handle) => Promise<T>): Promise<T> {
  return ctx.db.transaction((tx) => ctx.queue.markInside(() => work(tx)));
}
