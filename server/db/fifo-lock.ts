/** Lets one task in at a time, in the order in which they came. */
export class FifoLock {
  #last: Promise<unknown> = Promise.resolve();

  /** Runs `task` when every earlier one is over; gives what it gives. */
  run<T>(task: () => T | Promise<T>): Promise<T> {
    const result = this.#last.then(task);
    this.#last = result.catch(() => undefined);
    return result;
  }
}
