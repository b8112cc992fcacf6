import { once } from 'node:events';
import { Worker } from 'node:worker_threads';
import { Bounded } from '../http/bounded.js';
import { type Compute, type TaskInput, type TaskName, type TaskOutput, TooMuchWorkError } from './tasks.js';
import type { TaskMessage, TaskReply } from './worker.js';

export interface ComputePoolOptions {
  /** Threads at most. */
  readonly threads?: number;
  /** The longest that a task may take, ms. Its memory is bounded by this too. */
  readonly limitMs?: number;
}

const MAY_WAIT = 100;

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
      const message: TaskMessage = { name, input };
      const output = await this.#reply(worker, message);
      this.#idle.push(worker);
      return output as TaskOutput<N>;
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

  async #reply(worker: Worker, message: TaskMessage): Promise<unknown> {
    const timer = new AbortController();
    const timeout = setTimeout(() => timer.abort(), this.#limitMs);
    try {
      worker.postMessage(message);
      const [reply] = (await once(worker, 'message', { signal: timer.signal })) as [TaskReply];
      if (reply.kind === 'done') return reply.output;
      // The thread is sound, but it may be holding what the task left behind.
      await worker.terminate();
      throw Object.assign(new Error(reply.kind === 'failed' ? reply.message : 'The thread started anew.'), {
        ...(reply.kind === 'failed' ? { stack: reply.stack } : {}),
      });
    } catch (error) {
      await worker.terminate();
      throw timer.signal.aborted
        ? new TooMuchWorkError(`The task took longer than ${this.#limitMs} ms.`)
        : error;
    } finally {
      clearTimeout(timeout);
    }
  }

  #forget(worker: Worker): void {
    this.#all.delete(worker);
    const at = this.#idle.indexOf(worker);
    if (at >= 0) this.#idle.splice(at, 1);
  }
}
