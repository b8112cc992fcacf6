import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  ElementRef,
  afterNextRender,
  computed,
  inject,
  input,
  linkedSignal,
  model,
  output,
  signal,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { BarState } from '@shared/bar';
import type { Assembly } from '@shared/design';
import type { Overhang } from '@shared/forging';
import type { Hatch, Steel } from '@shared/steels';
import type { Format } from '@shared/units';
import { type AssemblyHit, assemblyGeometry, pieceLanding } from './assembly-geometry';
import { assemblyKey, endForEnd, turned } from './assembly-keys';
import { assemblyFrame, assemblyViewport, entryAt, pieceList } from './assembly-scene';
import { assemblyText, pieceText } from './assembly-text';
import {
  type AssemblySheet,
  type AssemblyTool,
  IDLE_ASSEMBLY,
  assemblyHoldsTouch,
  assemblyTool,
  hitOnAssembly,
  isAssembling,
} from './assembly-tool';
import { laidPieces } from './bar-scene';
import { type AssemblyGesture, BAR_DRAG_TYPE, type GestureEnd } from './contract';
import { type AssemblyPicture, paintAssembly, paintAssemblyWork } from './draw-assembly';
import { HatchTiles } from './hatch-tiles';
import { measureText, paperUnder } from './paper';
import type { Drawing } from './sheet';
import { listenOn } from './sheet-events';
import { sheetIn } from './sheet-view';
import { inksOf } from './steel-inks';
import type { ToolInput } from './tool';
import { type PointPx, toMm } from './viewport';

let nextId = 0;

/** What an assembly was when a gesture began: the gesture speaks of that. */
interface Ground {
  readonly assembly: Assembly;
  readonly made: BarState;
  readonly pieces: readonly BarState[];
  readonly overhangs: readonly Overhang[];
}

/**
 * The end section of an assembly, to scale: pieces are carried to another place, turned by quarters and end for end. It
 * changes nothing itself: what is done comes out as gestures, see `contract.ts`.
 */
@Component({
  selector: 'lw-assembly-canvas',
  imports: [MatButton],
  templateUrl: './assembly-canvas.html',
  styleUrl: './drawing.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AssemblyCanvas {
  readonly assembly = input.required<Assembly>();
  /** The bar that the pieces make. */
  readonly made = input.required<BarState>();
  /** The pieces as they are laid in, turned, before trimming. */
  readonly pieces = input.required<readonly BarState[]>();
  /** What is trimmed of each piece. */
  readonly overhangs = input<readonly Overhang[]>([]);
  /** Names of bars by id. */
  readonly names = input.required<ReadonlyMap<string, string>>();
  /** The steels laid, in the order that sections count in. */
  readonly steels = input.required<readonly Steel[]>();
  readonly format = input.required<Format>();
  /** Hatches by steel id, where several drawings must agree. */
  readonly hatches = input<ReadonlyMap<string, Hatch>>();
  /** Place of the chosen piece, 0 at the bottom or left; null: none. */
  readonly selected = model<number | null>(null);

  readonly gestureStart = output();
  readonly gestureEdit = output<AssemblyGesture>();
  readonly gestureEnd = output<GestureEnd>();

  protected readonly id = `lw-assembly-${nextId++}`;
  private readonly container = viewChild.required<ElementRef<HTMLDivElement>>('sheet');
  private readonly paper = paperUnder(inject<ElementRef<HTMLElement>>(ElementRef).nativeElement);
  private readonly tiles = new HatchTiles();
  private readonly size = sheetIn(this.container, () => this.drawings());

  private readonly tool = signal<AssemblyTool>(IDLE_ASSEMBLY);
  private readonly hover = signal<AssemblyHit>({ kind: 'empty' });
  private readonly dropAt = signal<number | null>(null);
  private readonly isChosenByKey = signal(false);

  private readonly given = computed<Ground>(() => ({
    assembly: this.assembly(),
    made: this.made(),
    pieces: this.pieces(),
    overhangs: this.overhangs(),
  }));
  private readonly ground = linkedSignal<{ given: Ground; isHeld: boolean }, Ground>({
    source: () => ({ given: this.given(), isHeld: this.tool().kind === 'moving' }),
    computation: ({ given, isHeld }, before) => (isHeld && before ? before.value : given),
  });
  /** Turning shows at once; only the scale waits until it is done. */
  private readonly scaleGround = linkedSignal<{ given: Ground; isHeld: boolean }, Ground>({
    source: () => ({ given: this.given(), isHeld: isAssembling(this.tool()) }),
    computation: ({ given, isHeld }, before) => (isHeld && before ? before.value : given),
  });
  private readonly frame = computed(() => assemblyFrame(this.size().widthPx, this.size().heightPx));
  private readonly laid = computed(() => laidOf(this.ground()));
  private readonly viewport = computed(() => {
    const ground = this.scaleGround();
    return assemblyViewport(ground.made, laidOf(ground), this.frame());
  });
  private readonly geometry = computed(() => assemblyGeometry(this.laid(), this.ground().assembly.along));
  private readonly list = computed(() => {
    // New fonts are measured anew.
    this.paper();
    const { assembly } = this.ground();
    return pieceList(
      assembly,
      this.laid(),
      this.names(),
      this.format(),
      this.viewport(),
      this.frame(),
      measureText,
    );
  });
  /** While a piece is carried, the choice that the document knows is already where it would land. */
  protected readonly chosen = computed(() => {
    const tool = this.tool();
    const place = tool.kind === 'moving' ? tool.place : this.selected();
    return place !== null && place < this.ground().assembly.pieces.length ? place : null;
  });
  private readonly picture = computed<AssemblyPicture>(() => ({
    bar: this.ground().made,
    laid: this.laid(),
    along: this.ground().assembly.along,
    geometry: this.geometry(),
    viewport: this.viewport(),
    frame: this.frame(),
    list: this.list(),
    chosen: this.chosen(),
    inks: inksOf(this.steels(), this.hatches()),
    tiles: this.tiles,
    paper: this.paper(),
    format: this.format(),
  }));
  private readonly base = computed<Drawing>(() => ({
    id: 'assembly',
    on: 'base',
    paint: paintAssembly(this.picture()),
  }));
  private readonly drawings = computed<readonly Drawing[]>(() => [
    this.base(),
    {
      id: 'work',
      on: 'over',
      paint: paintAssemblyWork({
        picture: this.picture(),
        tool: this.tool(),
        hover: this.hover(),
        dropAt: this.dropAt(),
        headline: this.headline(),
      }),
    },
  ]);
  private readonly headline = computed(() => {
    const tool = this.tool();
    const { assembly } = this.ground();
    const drop = this.dropAt();
    if (drop !== null) return `Lay it ${placeWords(drop, assembly)}`;
    if (tool.kind === 'moving') {
      const isHere = tool.to === null || tool.to === tool.place || tool.to === tool.place + 1;
      return isHere ? 'Leave the piece here' : `Put the piece ${placeWords(tool.to, assembly)}`;
    }
    const hover = this.hover();
    const shown = hover.kind === 'empty' ? this.chosen() : hover.place;
    return shown === null
      ? `End section, ${this.format().length(this.made().lengthMm)} long`
      : this.wordsFor(shown);
  });

  protected readonly text = computed(() =>
    assemblyText(this.assembly(), this.made(), this.pieces(), this.overhangs(), this.names(), this.format()),
  );
  protected readonly announcement = computed(() => {
    const chosen = this.chosen();
    if (!this.isChosenByKey()) return '';
    return chosen === null ? 'Nothing selected' : this.wordsFor(chosen);
  });

  constructor() {
    const stop = new AbortController();
    inject(DestroyRef).onDestroy(() => stop.abort());
    afterNextRender(() => {
      listenOn(
        this.container().nativeElement,
        {
          input: (input) => this.dispatch(input),
          hover: (at, device) =>
            this.hover.set(at === null ? { kind: 'empty' } : hitOnAssembly(this.sheetNow(), at, device)),
          key: (event) => this.keyed(event),
          isBusy: () => this.tool().kind !== 'idle',
          holdsTouch: () => assemblyHoldsTouch(this.tool()),
          dropType: BAR_DRAG_TYPE,
          dropOver: (at) => this.dropAt.set(at && this.landing(at)),
          drop: (at, bar) => this.dropped(at, bar),
        },
        stop.signal,
      );
    });
  }

  protected turn(): void {
    this.whole(turned(1, this.assembly().pieces, this.chosen()));
  }

  protected reverse(): void {
    this.whole(endForEnd(this.assembly().pieces, this.chosen()));
  }

  protected layOtherwise(): void {
    const along = this.assembly().along === 'thickness' ? 'width' : 'thickness';
    this.whole({ kind: 'gesture', gesture: { kind: 'along', along }, selection: this.chosen() });
  }

  private sheetNow(): AssemblySheet {
    return {
      geometry: this.geometry(),
      viewport: this.viewport(),
      pieces: this.ground().assembly.pieces,
      chosen: this.chosen(),
      labelAt: (at) => entryAt(this.list(), at),
    };
  }

  private dispatch(input: ToolInput): void {
    const { tool, out } = assemblyTool(this.tool(), input, this.sheetNow());
    this.tool.set(tool);
    for (const asked of out) {
      switch (asked.kind) {
        case 'start':
          this.gestureStart.emit();
          break;
        case 'edit':
          this.gestureEdit.emit(asked.gesture);
          break;
        case 'end':
          this.gestureEnd.emit(asked.end);
          break;
        case 'select':
          this.choose(asked.selection, false);
          break;
        case 'view':
          break;
      }
    }
  }

  private keyed(event: KeyboardEvent): boolean {
    const { key, shiftKey: shift, altKey: alt } = event;
    const press = { key, shift, alt, command: event.ctrlKey || event.metaKey };
    const asked = assemblyKey(press, this.assembly().pieces, this.chosen());
    if (asked === null) return false;
    if (asked.kind === 'gesture') this.whole(asked);
    this.choose(asked.selection, true);
    return true;
  }

  private landing(at: PointPx): number {
    return pieceLanding(this.geometry(), toMm(this.viewport(), at));
  }

  private dropped(at: PointPx, bar: string): void {
    const place = this.landing(at);
    this.whole({ kind: 'gesture', gesture: { kind: 'insert', at: place, bar }, selection: place });
    this.choose(place, false);
  }

  private whole(asked: ReturnType<typeof assemblyKey>): void {
    if (asked?.kind !== 'gesture') return;
    this.gestureStart.emit();
    this.gestureEdit.emit(asked.gesture);
    this.gestureEnd.emit('settle');
  }

  private choose(place: number | null, isByKey: boolean): void {
    this.isChosenByKey.set(isByKey);
    this.selected.set(place);
  }

  private wordsFor(place: number): string {
    const { assembly, pieces } = this.ground();
    return pieceText(assembly, place, pieces, this.names(), this.format());
  }
}

function laidOf({ made, pieces, overhangs, assembly }: Ground): ReturnType<typeof laidPieces> {
  return laidPieces(made, pieces, overhangs, assembly.along);
}

function placeWords(to: number, { along, pieces }: Assembly): string {
  if (to === 0) return along === 'thickness' ? 'at the bottom' : 'at the left';
  if (to >= pieces.length) return along === 'thickness' ? 'on top' : 'at the right';
  return `between pieces ${to} and ${to + 1}`;
}
