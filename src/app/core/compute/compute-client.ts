import { DestroyRef, Injectable, inject } from '@angular/core';
import type { Design } from '@shared/design';
import { Observable, type Subscriber } from 'rxjs';
import { type ComputePort, OPEN_PORT } from './compute-port';
import type { Answer, Failure, PicturePart, PictureTask, ProbeTask, Request } from './messages';
import type { Probe } from './probe';

/** A task with the design itself in place of its number. */
export type Ordered<T extends { readonly design: number }> = Omit<T, 'design'> & { readonly design: Design };
export type PictureOrder = Ordered<PictureTask>;
export type ProbeOrder = Ordered<ProbeTask>;

/** Why a picture or an answer didn't come. */
export class ComputeFailure extends Error {
  override readonly name = 'ComputeFailure';

  constructor(readonly failure: Failure) {
    super(failure.message || failure.code);
  }
}

/** Designs that the worker is left with. */
const MOST_DESIGNS = 24;

type Unnumbered = Request extends infer R ? (R extends Request ? Omit<R, 'requestId'> : never) : never;

interface Open {
  readonly lane: string | null;
  readonly answered: (answer: Answer) => void;
  readonly failed: (failure: Failure) => void;
  readonly dropped: () => void;
}

/**
 * Has pictures made and questions answered by a worker, so that nothing blocks the page. A design goes over once; what
 * is asked about it later names it by number.
 */
@Injectable({ providedIn: 'root' })
export class ComputeClient {
  private readonly openPort = inject(OPEN_PORT);
  private port: ComputePort | null = null;
  private lastId = 0;
  private lastKey = 0;
  private readonly open = new Map<number, Open>();
  /** The designs that the worker knows; the one asked about last comes last. */
  private readonly keys = new Map<Design, number>();

  constructor() {
    inject(DestroyRef).onDestroy(() => this.port?.close());
  }

  /** Starts the worker before anything is asked of it. */
  warmUp(): void {
    this.portNow();
  }

  /**
   * A picture, coarse first, then finer; completes when nothing is left to refine, or when a newer one in the same lane
   * takes its place. Nobody listening any more stops it.
   */
  picture(order: PictureOrder): Observable<PicturePart> {
    return new Observable((subscriber) => {
      for (const [id, other] of this.open) {
        if (other.lane !== order.lane) continue;
        this.open.delete(id);
        other.dropped();
      }
      const payload = { ...order, design: this.keyOf(order.design) };
      return this.ask(subscriber, { kind: 'picture', payload }, order.lane, (answer) => {
        if (answer.kind !== 'picture') return false;
        subscriber.next(answer.payload);
        return answer.payload.stage === 'done';
      });
    });
  }

  /** What is at a place of a surface; null where there is no metal. */
  probe(order: ProbeOrder): Observable<Probe | null> {
    return new Observable((subscriber) => {
      const payload = { ...order, design: this.keyOf(order.design) };
      return this.ask(subscriber, { kind: 'probe', payload }, null, (answer) => {
        if (answer.kind !== 'probe') return false;
        subscriber.next(answer.payload);
        return true;
      });
    });
  }

  /** Stops what runs in a lane and frees what was kept for its next picture. */
  release(lane: string): void {
    if (this.port) this.send({ kind: 'release', payload: { lane } });
  }

  /**
   * Sends a request and waits for its answers.
   * @param take what to do with an answer; gives whether it was the last
   */
  private ask(
    subscriber: Pick<Subscriber<never>, 'error' | 'complete'>,
    request: Unnumbered,
    lane: string | null,
    take: (answer: Answer) => boolean,
  ): () => void {
    const requestId = this.send(request);
    this.open.set(requestId, {
      lane,
      answered: (answer) => {
        if (!take(answer)) return;
        this.open.delete(requestId);
        subscriber.complete();
      },
      failed: (failure) => {
        this.open.delete(requestId);
        subscriber.error(new ComputeFailure(failure));
      },
      dropped: () => subscriber.complete(),
    });
    return () => {
      if (this.open.delete(requestId)) this.send({ kind: 'stop', payload: null }, requestId);
    };
  }

  private keyOf(design: Design): number {
    const known = this.keys.get(design);
    this.keys.delete(design);
    const key = known ?? ++this.lastKey;
    this.keys.set(design, key);
    if (known !== undefined) return key;
    this.send({ kind: 'design', payload: { key, design } });
    const [oldest] = this.keys;
    if (this.keys.size > MOST_DESIGNS && oldest) {
      const [gone, goneKey] = oldest;
      this.keys.delete(gone);
      this.send({ kind: 'forget', payload: { key: goneKey } });
    }
    return key;
  }

  private send(request: Unnumbered, requestId = ++this.lastId): number {
    this.portNow().send({ ...request, requestId });
    return requestId;
  }

  private portNow(): ComputePort {
    this.port ??= this.openPort({
      answered: (answer) => this.answered(answer),
      broke: (message) => this.broke(message),
    });
    return this.port;
  }

  /** What nobody waits for any more is dropped. */
  private answered(answer: Answer): void {
    const waiting = this.open.get(answer.requestId);
    if (answer.kind === 'failed') waiting?.failed(answer.payload);
    else waiting?.answered(answer);
  }

  /** The next thing asked for starts a new worker. */
  private broke(message: string): void {
    this.port?.close();
    this.port = null;
    this.keys.clear();
    const waiting = [...this.open.values()];
    this.open.clear();
    for (const one of waiting) one.failed({ code: 'broken', message });
  }
}
