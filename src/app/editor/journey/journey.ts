import { ChangeDetectionStrategy, Component, computed, inject, signal, viewChildren } from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MatIconModule } from '@angular/material/icon';
import { MatMenuModule } from '@angular/material/menu';
import { MatTooltipModule } from '@angular/material/tooltip';
import { type Bar, MAX_BARS, usersOf } from '@shared/design';
import type { ForgedBar } from '@shared/forging';
import { kindOf } from '@shared/steps';
import { UnitsStore } from '../../core/units/units-store';
import { BarsMapCanvas } from '../canvas/bars-map';
import { DesignStore } from '../design-store';
import { setResult } from '../document-edits';
import { commonScale } from '../sketch/common-scale';
import { BarStrip, type StepCommand } from './bar-strip';
import { BarWork } from './bar-work';
import { StepChoice } from './step-choice';
import { StepWork } from './step-work';

/** Room for a sketch in a tile, px. */
const SKETCH_BOX = { widthPx: 174, heightPx: 60 };

/** One bar with what its heading says. */
interface Strip {
  readonly bar: Bar;
  readonly forged: ForgedBar;
  readonly isResult: boolean;
  /** Names of the bars that it is laid into. */
  readonly runsInto: readonly string[];
}

/** The journey: for each bar one strip that shows it to scale after every step, and what can be done with the steps. */
@Component({
  selector: 'lw-journey',
  imports: [
    BarStrip,
    BarsMapCanvas,
    MatButtonModule,
    MatIconModule,
    MatMenuModule,
    MatTooltipModule,
    StepChoice,
  ],
  templateUrl: './journey.html',
  styleUrl: './journey.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Journey {
  protected readonly store = inject(DesignStore);
  protected readonly units = inject(UnitsStore);
  protected readonly steps = inject(StepWork);
  protected readonly bars = inject(BarWork);
  private readonly barStrips = viewChildren(BarStrip);

  protected readonly strips = computed((): readonly Strip[] => {
    const design = this.store.design();
    const forgings = this.store.forging().bars;
    return design.bars.map((bar, i) => ({
      bar,
      forged: forgings[i] as ForgedBar,
      isResult: bar.id === design.result,
      runsInto: usersOf(design, bar.id).map((user) => user.name),
    }));
  });
  protected readonly pxPerMm = computed(() => commonScale(this.store.forging(), SKETCH_BOX));
  protected readonly selected = this.store.selected;
  protected readonly selectedName = computed(() => {
    const { step } = this.selected();
    return step && kindOf(step).words.name;
  });
  protected readonly otherBars = computed(() =>
    this.store.design().bars.filter((bar) => bar.id !== this.selected().bar.id),
  );
  protected readonly canAddBar = computed(() => this.store.design().bars.length < MAX_BARS);
  protected readonly isMapShown = signal(false);
  protected readonly folded = signal<ReadonlySet<string>>(new Set());

  protected command(command: StepCommand): void {
    const { bar, step } = this.selected();
    if (step === null) return;
    switch (command) {
      case 'earlier':
        this.steps.moveBy(bar.id, step.id, -1);
        break;
      case 'later':
        this.steps.moveBy(bar.id, step.id, 1);
        break;
      case 'remove':
        this.steps.remove(bar.id, step.id);
        break;
      case 'duplicate':
        this.steps.duplicate(bar.id, step.id);
        break;
      case 'toggle':
        this.steps.toggle(bar.id, step.id);
        break;
    }
  }

  /** A command from the keyboard leaves the keyboard on the strip. */
  protected keyCommand(command: StepCommand): void {
    this.command(command);
    this.focusStrip();
  }

  protected focusStrip(): void {
    const { bar } = this.selected();
    this.barStrips()
      .find((strip) => strip.bar().id === bar.id)
      ?.focusSelected();
  }

  protected copyOne(toBarId: string): void {
    const { bar, place } = this.selected();
    this.steps.copyTo(bar.id, place - 1, place, toBarId);
  }

  protected copyFromHere(toBarId: string): void {
    const { bar, place } = this.selected();
    this.steps.copyTo(bar.id, place - 1, bar.steps.length, toBarId);
  }

  /** A bar on the map leads to its start. */
  protected selectBar(barId: string | null): void {
    if (barId !== null) this.store.select(barId, null);
  }

  protected toggleFold(barId: string): void {
    this.folded.update((folded) => {
      const next = new Set(folded);
      if (!next.delete(barId)) next.add(barId);
      return next;
    });
  }

  protected makeResult(barId: string): void {
    this.store.edit((design) => setResult(design, barId));
  }
}
