import type { InversionApi } from './protocol';

/** The worker was ended while a call was waiting. */
export class HandEnded extends Error {
  override name = 'HandEnded';
}

/** The worker could not be loaded or broke. */
export class HandBroken extends Error {
  override name = 'HandBroken';
}

/**
 * One worker. A call ends when its worker does: comlink's own promise would wait for ever after
 * `terminate`. Once it has failed it stays failed.
 */
export class Hand {
  #waiting = new Set<(reason: Error) => void>();
  #failure: Error | null = null;

  constructor(
    private readonly api: InversionApi,
    private readonly terminate: () => void,
  ) {}

  get failed(): boolean {
    return this.#failure !== null;
  }

  ask<T>(call: (api: InversionApi) => Promise<T>): Promise<T> {
    if (this.#failure) return Promise.reject(this.#failure);
    return new Promise<T>((resolve, reject) => {
      this.#waiting.add(reject);
      call(this.api)
        .then(resolve, reject)
        .finally(() => this.#waiting.delete(reject));
    });
  }

  fail(reason: Error): void {
    if (this.#failure) return;
    this.#failure = reason;
    this.terminate();
    this.#waiting.forEach((reject) => reject(reason));
    this.#waiting.clear();
  }

  end(): void {
    this.fail(new HandEnded('The worker was ended.'));
  }
}
