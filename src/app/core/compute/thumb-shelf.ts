import { Injectable, inject } from '@angular/core';
import { type Observable, last, of, tap } from 'rxjs';
import { ComputeClient, type PictureOrder } from './compute-client';
import type { PicturePart } from './messages';

/** Bytes of small pictures that are kept. */
const MOST_BYTES = 24_000_000;

let lanes = 0;

/** Small pictures, made one after the other behind everything larger, and kept while there is room. */
@Injectable({ providedIn: 'root' })
export class ThumbShelf {
  private readonly client = inject(ComputeClient);
  private readonly ids = new WeakMap<object, number>();
  private lastId = 0;
  /** The one looked at last comes last. */
  private readonly kept = new Map<string, PicturePart>();
  private bytes = 0;

  /**
   * The finished picture, once.
   * @param like stands for the bar that is shown: while it is the same, so is the picture. The design, or its state.
   */
  picture(order: Omit<PictureOrder, 'lane' | 'rank'>, like: object): Observable<PicturePart> {
    const { design, surface, widthPx, heightPx, at } = order;
    const hammered = [design.unevenness ?? 0, design.seed ?? 0];
    const blank = surface.kind === 'blade' ? design.blank : null;
    const key = JSON.stringify([this.idOf(like), hammered, at, surface, blank, widthPx, heightPx]);
    const known = this.kept.get(key);
    if (known) {
      this.kept.delete(key);
      this.kept.set(key, known);
      return of(known);
    }
    return this.client.picture({ ...order, lane: `thumb-${lanes++}`, rank: 9 }).pipe(
      last(),
      tap((part) => this.keep(key, part)),
    );
  }

  private keep(key: string, part: PicturePart): void {
    this.kept.set(key, part);
    this.bytes += part.pixels.length;
    for (const [oldest, { pixels }] of this.kept) {
      if (this.bytes <= MOST_BYTES || oldest === key) break;
      this.kept.delete(oldest);
      this.bytes -= pixels.length;
    }
  }

  private idOf(object: object): number {
    const id = this.ids.get(object) ?? ++this.lastId;
    this.ids.set(object, id);
    return id;
  }
}
