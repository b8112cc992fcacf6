/** The thread that works: takes tasks one at a time, answers each. */
import { parentPort } from 'node:worker_threads';
import { TASKS, type TaskName } from './tasks.js';

export interface TaskMessage {
  readonly name: TaskName;
  readonly input: unknown;
}

export type TaskReply =
  | { readonly kind: 'ready' }
  | { readonly kind: 'done'; readonly output: unknown }
  | { readonly kind: 'failed'; readonly message: string; readonly stack: string | undefined };

const port = parentPort;
if (!port) throw new Error('This is the code of a worker thread.');

port.on('message', ({ name, input }: TaskMessage) => {
  void replyTo(TASKS[name] as (input: unknown) => unknown, input).then((reply) => port.postMessage(reply));
});
port.postMessage({ kind: 'ready' } satisfies TaskReply);

async function replyTo(task: (input: unknown) => unknown, input: unknown): Promise<TaskReply> {
  try {
    return { kind: 'done', output: await task(input) };
  } catch (error) {
    const { message, stack } = error instanceof Error ? error : new Error(String(error));
    return { kind: 'failed', message, stack };
  }
}
