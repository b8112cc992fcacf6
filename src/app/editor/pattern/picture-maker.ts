import { DestroyRef, type Signal, effect, inject, signal, untracked } from '@angular/core';
import { ComputeClient, ComputeFailure } from '../../core/compute/compute-client';
import type { FailureCode, PicturePart } from '../../core/compute/messages';
import type { Frame } from './frame';
import { type PictureSource, SAMPLES, isSameSubject, orderOf } from './picture-source';
import { type ShownPicture, letGo, pictureOn } from './shown-picture';

/** What is asked for: a picture of a source, cut to a frame. */
export interface Wanted {
  readonly source: PictureSource;
  readonly frame: Frame;
}

/** What there is to be drawn, the lower one first. */
export interface Pictures {
  /** Coarse, of all that is in view. */
  readonly under: ShownPicture | null;
  /** Fine, of what is in view or was before it moved. */
  readonly over: ShownPicture | null;
}

/**
 * How long what is shown stays while only a coarse picture of something else is there, ms: usually the finer one comes
 * before, and nothing flickers while a slider moves.
 */
const COARSE_AFTER_MS = 60;

let lanes = 0;

/**
 * Has pictures made of what is wanted, and keeps what can be drawn meanwhile. Stops when the component goes. Call it
 * where `inject` may be called.
 */
export class PictureMaker {
  private readonly client = inject(ComputeClient);
  private readonly lane = `view-${lanes++}`;
  private readonly have = signal<Pictures>({ under: null, over: null });
  /** What the fine picture is of. */
  private subject: PictureSource | null = null;
  private timer: ReturnType<typeof setTimeout> | undefined;
  private readonly attempts = signal(0);

  readonly pictures = this.have.asReadonly();
  readonly isRefining = signal(false);
  readonly failure = signal<FailureCode | null>(null);

  constructor(wanted: Signal<Wanted | null>) {
    this.client.warmUp();
    effect((onCleanup) => {
      const now = wanted();
      this.attempts();
      if (now === null) return;
      const subscription = untracked(() => this.make(now));
      onCleanup(() => subscription.unsubscribe());
    });
    inject(DestroyRef).onDestroy(() => {
      clearTimeout(this.timer);
      this.client.release(this.lane);
      this.have.update((pictures) => {
        letGo(pictures.under);
        letGo(pictures.over);
        return { under: null, over: null };
      });
    });
  }

  tryAgain(): void {
    this.attempts.update((count) => count + 1);
  }

  private make({ source, frame }: Wanted): { unsubscribe: () => void } {
    const { window, widthPx, heightPx } = frame;
    const order = { ...orderOf(source), window, widthPx, heightPx, samples: SAMPLES };
    this.isRefining.set(true);
    return this.client.picture({ ...order, lane: this.lane, rank: 0, isKept: true }).subscribe({
      next: (part) => this.take(part, source, frame),
      error: (error: unknown) => {
        clearTimeout(this.timer);
        this.isRefining.set(false);
        this.failure.set(error instanceof ComputeFailure ? error.failure.code : 'broken');
      },
    });
  }

  private take(part: PicturePart, source: PictureSource, frame: Frame): void {
    clearTimeout(this.timer);
    this.failure.set(null);
    this.isRefining.set(part.stage !== 'done');
    if (part.stage !== 'pixels') {
      this.subject = source;
      this.put({ under: null, over: pictureOn(part, frame) });
      return;
    }
    const before = this.have();
    if (before.over === null) {
      this.put({ under: pictureOn(part, frame), over: null });
    } else if (this.subject && isSameSubject(this.subject, source)) {
      this.put({ under: pictureOn(part, frame), over: before.over });
    } else {
      this.timer = setTimeout(() => this.put({ under: pictureOn(part, frame), over: null }), COARSE_AFTER_MS);
    }
  }

  private put(next: Pictures): void {
    const before = this.have();
    for (const picture of [before.under, before.over]) {
      if (picture !== next.under && picture !== next.over) letGo(picture);
    }
    this.have.set(next);
  }
}
