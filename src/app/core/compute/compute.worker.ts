/// <reference lib="webworker" />
import { ComputeHost } from './compute-host';
import type { Request } from './messages';

// A message to itself lets those of the page in between two portions of work, sooner than a timer would.
const turn = new MessageChannel();
let next: (() => void) | null = null;
turn.port1.onmessage = () => {
  const run = next;
  next = null;
  run?.();
};

const host = new ComputeHost({
  post: (answer, transfer) => postMessage(answer, transfer),
  later: (run) => {
    next = run;
    turn.port2.postMessage(null);
  },
});
addEventListener('message', ({ data }: MessageEvent<Request>) => host.receive(data));
