import { CdkTrapFocus } from '@angular/cdk/a11y';
import { type ConnectedPosition, OverlayModule } from '@angular/cdk/overlay';
import { NgTemplateOutlet } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  type TemplateRef,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatSliderModule } from '@angular/material/slider';
import { MatTooltip } from '@angular/material/tooltip';
import { type Design, steelIdsOf, steelOf } from '@shared/design';
import type { Moment } from '@shared/pattern';
import { toneOf } from '@shared/steels';
import { UnitsStore } from '../../core/units/units-store';
import { elementSize } from './element-size';
import { LookPanel } from './look-panel';
import { type PictureFacts, pictureText, viewText } from './picture-text';
import { type Found, PictureSheet } from './picture-sheet';
import type { PictureSource } from './picture-source';
import { probeSentence, probeWords } from './probe-text';
import { SaveDialog, type SaveTask } from './save-dialog';
import { type Mode, Sight } from './sight';
import { SolidView } from './solid/solid-view';
import { type BarSize, type Place, VIEW_IDS, movedTo, shownView, viewGroups } from './views';

const MODE_LABELS: readonly { readonly mode: Mode; readonly label: string }[] = [
  { mode: 'surface', label: 'Surface' },
  { mode: 'solid', label: 'Solid' },
  { mode: 'drawing', label: 'Drawing' },
];

/** From this height on, CSS px, the drawing stands below the picture. */
const TALL_PX = 620;

let nextId = 0;

/**
 * The etched picture of a bar at one moment, so that one sees the pattern come about: any face, cut or the blade, flat
 * or as a solid to be turned; or the drawing that is given.
 */
@Component({
  selector: 'lw-pattern-view',
  imports: [
    CdkTrapFocus,
    LookPanel,
    MatIconButton,
    MatSliderModule,
    MatTooltip,
    NgTemplateOutlet,
    OverlayModule,
    PictureSheet,
    SolidView,
  ],
  templateUrl: './pattern-view.html',
  styleUrl: './pattern-view.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PatternView {
  readonly design = input.required<Design>();
  readonly at = input.required<Moment>();
  /** The bar as it is then. */
  readonly bar = input.required<BarSize & { readonly layers: number }>();
  /** "after Draw out", "as it is put together". */
  readonly moment = input.required<string>();
  /** Whether this is the bar, and the moment, that the blade is ground from. */
  readonly isResult = input.required<boolean>();
  /** What can be seen instead of the picture; null: nothing. */
  readonly drawing = input<TemplateRef<unknown> | null>(null);
  readonly unevennessChange = output<number>();
  readonly unevennessEnd = output();

  protected readonly id = `lw-pattern-${nextId++}`;
  protected readonly lookPositions: ConnectedPosition[] = [
    { originX: 'end', originY: 'bottom', overlayX: 'end', overlayY: 'top' },
    { originX: 'end', originY: 'top', overlayX: 'end', overlayY: 'bottom' },
  ];
  protected readonly sight = inject(Sight);
  private readonly units = inject(UnitsStore);
  private readonly dialog = inject(MatDialog);

  protected readonly format = this.units.format;
  protected readonly modes = computed(() =>
    MODE_LABELS.filter(({ mode }) => mode !== 'drawing' || this.drawing() !== null),
  );
  protected readonly mode = computed(() =>
    this.sight.mode() === 'drawing' && this.drawing() === null ? 'surface' : this.sight.mode(),
  );
  /** There is room for the drawing below the picture. */
  protected readonly isTall = computed(() => this.drawing() !== null && this.size().heightPx >= TALL_PX);
  private readonly size = elementSize(signal(inject<ElementRef<HTMLElement>>(ElementRef)));
  protected readonly isLookOpen = signal(false);
  protected readonly found = signal<Found | null>(null);

  private readonly blank = computed(() => (this.isResult() ? this.design().blank : undefined));
  protected readonly groups = computed(() => viewGroups(this.blank() !== undefined));
  protected readonly view = computed(() =>
    shownView(this.sight.choice(), this.bar(), this.blank(), this.format()),
  );
  protected readonly source = computed<PictureSource>(() => ({
    design: this.design(),
    at: this.at(),
    view: this.view(),
    look: this.sight.look(),
    isGrey: this.sight.isGrey(),
  }));

  private readonly names = computed(() => {
    const design = this.design();
    const ids = steelIdsOf(design);
    return {
      steels: new Map(ids.map((id) => [id, steelOf(design, id)?.name ?? id])),
      bars: new Map(design.bars.map(({ id, name }) => [id, name])),
    };
  });
  private readonly facts = computed<PictureFacts>(() => {
    const design = this.design();
    const tones = steelIdsOf(design).flatMap((id) => {
      const steel = steelOf(design, id);
      return steel ? [{ name: steel.name, tone: toneOf(steel) }] : [];
    });
    const brightest = [...tones].sort((a, b) => b.tone.brightness - a.tone.brightness);
    return {
      view: this.view(),
      moment: this.moment(),
      bar: this.names().bars.get(this.at().bar) ?? this.at().bar,
      layers: this.bar().layers,
      steels: brightest.map(({ name, tone }) => ({ name, tone: tone.words })),
    };
  });
  protected readonly text = computed(() => pictureText(this.facts(), this.format()));
  protected readonly solidText = computed(() => {
    const { bar, moment } = this.facts();
    return `${bar} ${moment}`;
  });

  protected readonly words = computed(() => {
    const probe = this.found()?.probe;
    return probe ? probeWords(probe, this.names(), this.format()) : null;
  });
  protected readonly announcement = computed(() => {
    const found = this.found();
    if (!found?.isByKeys) return '';
    const words = this.words();
    return words ? probeSentence(words) : 'No metal here.';
  });
  protected readonly hint = computed(() =>
    this.found() ? 'No metal here.' : 'Point at a place to read its steel and layer.',
  );

  protected chooseView(event: Event): void {
    const { value } = event.target as HTMLSelectElement;
    const view = VIEW_IDS.find((id) => id === value);
    if (view) this.sight.set({ choice: { ...this.sight.choice(), view } });
  }

  protected movePlace(place: Place, mm: number): void {
    this.sight.set({ choice: movedTo(this.sight.choice(), place, mm) });
  }

  protected closeLook(): void {
    this.isLookOpen.set(false);
    this.unevennessEnd.emit();
  }

  protected lookKey(event: KeyboardEvent): void {
    if (event.key === 'Escape') this.closeLook();
  }

  protected save(): void {
    const design = this.design();
    const data: SaveTask = {
      source: this.source(),
      name: design.name,
      caption: `${design.name}: ${viewText(this.view(), this.format())}, ${this.moment()}`,
    };
    this.dialog.open(SaveDialog, { data, maxWidth: 'min(520px, 96vw)' });
  }
}
