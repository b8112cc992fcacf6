import { InjectionToken } from '@angular/core';
import type { Answer, Request } from './messages';

/** The line between the page and whoever computes for it. */
export interface ComputePort {
  send(request: Request): void;
  /** Ends it; nothing is answered any more. */
  close(): void;
}

export interface PortHandlers {
  readonly answered: (answer: Answer) => void;
  /** It broke: nothing of what was asked will be answered. */
  readonly broke: (message: string) => void;
}

export type OpenPort = (handlers: PortHandlers) => ComputePort;

/** Opens the line to a worker; specs give one that calls the same functions in-line. */
export const OPEN_PORT = new InjectionToken<OpenPort>('compute port', {
  providedIn: 'root',
  factory: () => openWorker,
});

function openWorker({ answered, broke }: PortHandlers): ComputePort {
  const worker = new Worker(new URL('./compute.worker', import.meta.url), { type: 'module' });
  worker.onmessage = ({ data }: MessageEvent<Answer>) => answered(data);
  worker.onmessageerror = () => broke('an answer could not be read');
  worker.onerror = (event) => {
    event.preventDefault();
    broke(event.message || 'the worker could not be started');
  };
  return {
    send: (request) => worker.postMessage(request),
    close: () => worker.terminate(),
  };
}
