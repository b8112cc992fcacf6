import { once } from 'node:events';
import { Worker } from 'node:worker_threads';
import { Bounded } from '../http/bounded.js';
import { type Compute, type TaskInput, type TaskName, type TaskOutput, TooMuchWorkError } from './tasks.js';
import type { TaskMessage, TaskReply } from './worker.js';

export interface ComputePoolOptions {
  /** Threads at most. */
  readonly threads?: number;
  /** The longest that working a design out may take, ms. Its memory is bounded by this too. */
  readonly limitMs?: number;
}

const MAY_WAIT = 100;

/** Printing lays out pages as well, and may have to load fonts first. */
const PRINT_FACTOR = 4;

/**
 * Does tasks on worker threads, so that a large design neither holds up other requests nor can be used to bring the
 * server down: a task that takes too long is ended together with its thread.
 */
export class ComputePool implements Compute {
  readonly #bounded: Bounded;
  readonly #limitMs: number;
  readonly #idle: Worker[] = [];
  readonly #all = new Set<Worker>();

  constructor({ threads = 2, limitMs = 2000 }: ComputePoolOptions = {}) {
    this.#bounded = new Bounded(threads, MAY_WAIT);
    this.#limitMs = limitMs;
  }

  run<N extends TaskName>(name: N, input: TaskInput<N>): Promise<TaskOutput<N>> {
    return this.#bounded.run(async () => {
      const worker = this.#idle.pop() ?? (await this.#start());
      const isPrint = name === 'forgeCard' || name === 'cutSheet';
      const output = await reply(worker, { name, input }, this.#limitMs * (isPrint ? PRINT_FACTOR : 1));
      this.#idle.push(worker);
      return output as TaskOutput<N>;
    });
  }

  /** Starts a thread before it is needed. */
  async warmUp(): Promise<void> {
    await this.#bounded.run(async () => {
      this.#idle.push(await this.#start());
    });
  }

  /** Ends the threads, and what they are doing. */
  async close(): Promise<void> {
    await Promise.all([...this.#all].map((worker) => worker.terminate()));
  }

  async #start(): Promise<Worker> {
    const file = import.meta.url.endsWith('.ts') ? './worker-from-sources.mjs' : './worker.js';
    const worker = new Worker(new URL(file, import.meta.url));
    // A server that ends does not wait for its threads.
    worker.unref();
    this.#all.add(worker);
    worker.once('exit', () => this.#forget(worker));
    // Whoever waits for the thread is told by the same event; one that fails while idle is just not used again.
    worker.on('error', () => this.#forget(worker));
    await once(worker, 'message');
    return worker;
  }

  #forget(worker: Worker): void {
    this.#all.delete(worker);
    const at = this.#idle.indexOf(worker);
    if (at >= 0) this.#idle.splice(at, 1);
  }
}

/** What a thread makes of a task. Unless it answers, and in time, the thread is ended: nobody knows what it holds. */
async function reply(worker: Worker, message: TaskMessage, limitMs: number): Promise<unknown> {
  const ended = new AbortController();
  const timeout = setTimeout(
    () => ended.abort(new TooMuchWorkError(`The task took longer than ${limitMs} ms.`)),
    limitMs,
  );
  const onExit = (): void => ended.abort(new Error('The thread has ended.'));
  worker.once('exit', onExit);
  try {
    worker.postMessage(message);
    const [answer] = (await once(worker, 'message', { signal: ended.signal })) as [TaskReply];
    if (answer.kind === 'done') return answer.output;
    throw Object.assign(new Error('The task failed.'), answer);
  } catch (error) {
    worker.off('exit', onExit);
    await worker.terminate();
    throw ended.signal.aborted ? ended.signal.reason : error;
  } finally {
    clearTimeout(timeout);
    worker.off('exit', onExit);
  }
}
