import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  computed,
  inject,
  input,
  viewChild,
} from '@angular/core';
import type { BarState } from '@shared/bar';
import type { ForgedState, Overhang } from '@shared/forging';
import type { Hatch, Steel } from '@shared/steels';
import type { Format } from '@shared/units';
import { alongOf, barScene, laidPieces } from './bar-scene';
import { barText } from './bar-text';
import { paintBar } from './draw-bar';
import { HatchTiles } from './hatch-tiles';
import { paperUnder } from './paper';
import type { Drawing } from './sheet';
import { sheetIn } from './sheet-view';
import { inksOf } from './steel-inks';

/** A forged bar to scale: from its left side, and the section at its near end. */
@Component({
  selector: 'lw-bar-canvas',
  template: '<div #sheet class="sheet"></div>',
  styleUrl: './drawing.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { role: 'img', '[attr.aria-label]': 'text()' },
})
export class BarCanvas {
  readonly state = input.required<ForgedState>();
  /** The steels laid, in the order that sections count in. */
  readonly steels = input.required<readonly Steel[]>();
  readonly format = input.required<Format>();
  /** What is trimmed of each piece, while an assembly's start is shown. */
  readonly overhangs = input<readonly Overhang[]>([]);
  /** The pieces as they were laid in, before trimming, while an assembly's start is shown. */
  readonly pieces = input<readonly BarState[]>([]);
  /** How they lie; told from their sizes when absent. */
  readonly along = input<'thickness' | 'width'>();
  /** Hatches by steel id, where several drawings must agree. */
  readonly hatches = input<ReadonlyMap<string, Hatch>>();

  private readonly container = viewChild.required<ElementRef<HTMLDivElement>>('sheet');
  private readonly paper = paperUnder(inject<ElementRef<HTMLElement>>(ElementRef).nativeElement);
  private readonly tiles = new HatchTiles();
  private readonly size = sheetIn(this.container, () => this.drawings());

  private readonly bar = computed(() => this.state().bar);
  /** A bar that was worked on since is one bar. */
  private readonly shown = computed(() => {
    const isStart = this.state().step === null;
    return { pieces: isStart ? this.pieces() : [], overhangs: isStart ? this.overhangs() : [] };
  });
  private readonly lies = computed(() => this.along() ?? alongOf(this.bar(), this.shown().pieces));
  private readonly inks = computed(() => inksOf(this.steels(), this.hatches()));
  private readonly laid = computed(() =>
    laidPieces(this.bar(), this.shown().pieces, this.shown().overhangs, this.lies()),
  );
  private readonly drawings = computed<readonly Drawing[]>(() => {
    const { widthPx, heightPx } = this.size();
    const paint = paintBar({
      bar: this.bar(),
      laid: this.laid(),
      along: this.lies(),
      scene: barScene(this.bar(), this.laid(), widthPx, heightPx),
      inks: this.inks(),
      tiles: this.tiles,
      paper: this.paper(),
      format: this.format(),
      widthPx,
      heightPx,
    });
    return [{ id: 'bar', on: 'base', paint }];
  });

  protected readonly text = computed(() =>
    barText(this.bar(), this.shown().overhangs, this.lies(), this.format()),
  );
}
