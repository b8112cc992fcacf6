import { type ChildProcessByStdio, spawn } from 'node:child_process';
import type { Readable, Writable } from 'node:stream';
import type { Order } from './order.js';

/** A process that will be killed, with its modules already loaded. */
export class Victim {
  readonly #process: ChildProcessByStdio<Writable, Readable, null>;
  readonly #ended: Promise<void>;
  #output = '';
  #onOutput: () => void = () => undefined;

  constructor(script: string) {
    this.#process = spawn(process.execPath, [script], { stdio: ['pipe', 'pipe', 'inherit'] });
    this.#process.stdin.on('error', () => undefined);
    this.#process.stdout.setEncoding('utf8').on('data', (text: string) => {
      this.#output += text;
      this.#onOutput();
    });
    this.#ended = new Promise((resolve) => {
      this.#process.once('close', () => {
        resolve();
        this.#onOutput();
      });
    });
  }

  /** Resolves when so many writes have been acknowledged. */
  async acknowledges(count: number): Promise<void> {
    await this.#until(() => this.#output.split('\n', count + 1).length > count);
  }

  /**
   * Lets it write, kills it when `moment`, asked for after the first acknowledgement, has come (unless it ends itself
   * before), and gives the revision that was acknowledged of each design.
   */
  async run(order: Order, moment: () => Promise<void>): Promise<Map<string, number>> {
    await this.#until(() => this.#output.includes('ready\n'));
    this.#output = '';
    this.#process.stdin.write(`${JSON.stringify(order)}\n`);
    await Promise.race([this.acknowledges(1), this.#ended]);
    await Promise.race([moment(), this.#ended]);
    this.kill();
    await this.#ended;
    const acknowledged = new Map<string, number>();
    // A last line cut short was not promised.
    for (const line of this.#output.split('\n').slice(0, -1)) {
      const [id = '', revision] = line.split(' ');
      acknowledged.set(id, Number(revision));
    }
    return acknowledged;
  }

  kill(): void {
    this.#process.kill('SIGKILL');
  }

  /** Resolves when its output is as wanted, or when it has ended. */
  #until(isReached: () => boolean): Promise<void> {
    return new Promise((resolve) => {
      this.#onOutput = () => {
        if (isReached() || this.#process.signalCode !== null || this.#process.exitCode !== null) resolve();
      };
      this.#onOutput();
    });
  }
}
