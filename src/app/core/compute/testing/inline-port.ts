import { ComputeHost } from '../compute-host';
import type { OpenPort } from '../compute-port';
import type { Answer, Request } from '../messages';

/** A port that computes in-line, with the same functions as the worker, when the spec says so. */
export interface InlinePort {
  readonly open: OpenPort;
  /** Everything that was sent, in order. */
  readonly sent: readonly Request[];
  /** Everything that came back, in order, whether or not anybody waited for it. */
  readonly answers: readonly Answer[];
  /** One portion of work. @returns whether there was any */
  step(): boolean;
  /** Works until nothing is left. */
  runAll(): void;
  /** As if the worker had died. */
  breakDown(message: string): void;
}

/** @param isEager works by itself, a portion for each turn of the event loop */
export function inlinePort(isEager = false): InlinePort {
  const sent: Request[] = [];
  const answers: Answer[] = [];
  let next: (() => void) | null = null;
  let broke: (message: string) => void = () => undefined;
  const port: InlinePort = {
    sent,
    answers,
    open: (handlers) => {
      broke = handlers.broke;
      let isOpen = true;
      const host = new ComputeHost({
        // What crosses a real line is copied or handed over: so it is here.
        post: (answer, transfer) => {
          const copy = structuredClone(answer, { transfer });
          answers.push(copy);
          queueMicrotask(() => isOpen && handlers.answered(copy));
        },
        later: (run) => {
          next = run;
          if (isEager) setTimeout(() => port.step());
        },
      });
      return {
        send: (request) => {
          sent.push(request);
          const copy = structuredClone(request);
          queueMicrotask(() => isOpen && host.receive(copy));
        },
        close: () => (isOpen = false),
      };
    },
    step: () => {
      const run = next;
      next = null;
      run?.();
      return run !== null;
    },
    runAll: () => {
      while (port.step());
    },
    breakDown: (message) => broke(message),
  };
  return port;
}
