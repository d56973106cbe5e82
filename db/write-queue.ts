import { AsyncLocalStorage } from 'node:async_hooks';

/**
 * One write at a time in this process. The local libSQL driver loses rows after SQLITE_BUSY, so two
 * writers must never meet; waiting here is cheaper than waiting on the file lock.
 */
export class WriteQueue {
  #last: Promise<void> = Promise.resolve();
  readonly #inside = new AsyncLocalStorage<boolean>();

  /** Waits for the writes before this one; the caller must call the answer once it is done. */
  async enter(): Promise<() => void> {
    if (this.#inside.getStore()) {
      throw new Error(
        'A write inside a transaction must go through the handle of that transaction.',
      );
    }
    const before = this.#last;
    let leave = () => {};
    this.#last = new Promise((resolve) => {
      leave = resolve;
    });
    await before;
    return leave;
  }

  async run<T>(work: () => Promise<T>): Promise<T> {
    const leave = await this.enter();
    try {
      return await work();
    } finally {
      leave();
    }
  }

  /** Marks everything that `work` starts as inside a transaction: a second one would wait for ever. */
  markInside<T>(work: () => Promise<T>): Promise<T> {
    return this.#inside.run(true, work);
  }
}
