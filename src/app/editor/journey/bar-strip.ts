import { type CdkDragDrop, CdkDrag, CdkDropList } from '@angular/cdk/drag-drop';
import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  Injector,
  afterNextRender,
  computed,
  inject,
  input,
  output,
} from '@angular/core';
import { MatMenuTrigger } from '@angular/material/menu';
import { type Warning, refusalReason } from '@shared/checks';
import type { Bar, Design } from '@shared/design';
import type { ForgedBar } from '@shared/forging';
import type { Steel } from '@shared/steels';
import type { StepKindName } from '@shared/steps';
import type { Format } from '@shared/units';
import { BarSketch } from '../sketch/bar-sketch';
import { StepChoice } from './step-choice';
import { type Tile, tilesOf } from './tiles';

/** What is to be done with a step of the strip. */
export type StepCommand = 'earlier' | 'later' | 'remove' | 'duplicate' | 'toggle';

/**
 * The journey of one bar: a tile for its start and for each step, a seam before and behind each step to insert one.
 *
 * One tile is in the tab order; arrow keys go along the strip and select, Alt with an arrow moves the step, Delete
 * removes it, Insert adds one behind it.
 */
@Component({
  selector: 'lw-bar-strip',
  imports: [BarSketch, CdkDrag, CdkDropList, MatMenuTrigger, StepChoice],
  templateUrl: './bar-strip.html',
  styleUrl: './bar-strip.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BarStrip {
  readonly design = input.required<Design>();
  readonly bar = input.required<Bar>();
  readonly forged = input.required<ForgedBar>();
  readonly steels = input.required<readonly Steel[]>();
  readonly warnings = input.required<readonly Warning[]>();
  readonly format = input.required<Format>();
  /** The same for every strip, so that bars can be compared. */
  readonly pxPerMm = input.required<number>();
  /** Undefined while another bar is selected; null for the start. */
  readonly selectedStepId = input.required<string | null | undefined>();

  readonly selectedStepIdChange = output<string | null>();
  readonly stepInsert = output<{ readonly kind: StepKindName; readonly at: number }>();
  /** A step goes to a place, counted without it. */
  readonly stepMove = output<{ readonly stepId: string; readonly to: number }>();
  readonly stepCommand = output<StepCommand>();

  private readonly element = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly injector = inject(Injector);

  protected readonly tiles = computed(() =>
    tilesOf(this.bar(), this.forged(), this.warnings(), this.format(), (refusal) =>
      sentence(refusalReason(refusal, this.design(), this.format())),
    ),
  );
  /** The tile that Tab goes to. */
  protected readonly tabPlace = computed(() => {
    const id = this.selectedStepId();
    return Math.max(
      0,
      this.tiles().findIndex((tile) => tile.stepId === id),
    );
  });

  /** Brings the keyboard to the selected tile once it is drawn. */
  focusSelected(): void {
    afterNextRender(() => this.tileAt(this.tabPlace())?.focus(), { injector: this.injector });
  }

  protected dropped(event: CdkDragDrop<unknown>): void {
    const step = this.bar().steps[event.previousIndex];
    if (step && event.previousIndex !== event.currentIndex) {
      this.stepMove.emit({ stepId: step.id, to: event.currentIndex });
    }
  }

  protected key(event: KeyboardEvent, tile: Tile): void {
    if (event.ctrlKey || event.metaKey) return;
    const command = event.altKey ? ALT_COMMANDS[event.key] : COMMANDS[event.key];
    if (command !== undefined) {
      event.preventDefault();
      if (tile.stepId !== null) this.stepCommand.emit(command);
      return;
    }
    if (event.altKey) return;
    if (event.key === 'Insert') {
      event.preventDefault();
      this.seamBehind(tile.place)?.click();
      return;
    }
    const to = placeByKey(event.key, tile.place, this.tiles().length - 1);
    if (to === null) return;
    event.preventDefault();
    const next = this.tiles()[to];
    if (!next || to === tile.place) return;
    this.selectedStepIdChange.emit(next.stepId);
    this.focusSelected();
  }

  private tileAt(place: number): HTMLElement | undefined {
    return this.all('.tile')[place];
  }

  private seamBehind(place: number): HTMLElement | undefined {
    return this.all('.seam')[place];
  }

  private all(selector: string): readonly HTMLElement[] {
    return [...this.element.nativeElement.querySelectorAll<HTMLElement>(selector)];
  }
}

const COMMANDS: Readonly<Record<string, StepCommand>> = { Delete: 'remove', Backspace: 'remove' };
const ALT_COMMANDS: Readonly<Record<string, StepCommand>> = {
  ArrowLeft: 'earlier',
  ArrowUp: 'earlier',
  ArrowRight: 'later',
  ArrowDown: 'later',
};

function placeByKey(key: string, place: number, last: number): number | null {
  switch (key) {
    case 'ArrowRight':
    case 'ArrowDown':
      return Math.min(last, place + 1);
    case 'ArrowLeft':
    case 'ArrowUp':
      return Math.max(0, place - 1);
    case 'Home':
      return 0;
    case 'End':
      return last;
    default:
      return null;
  }
}

function sentence(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}
