import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  untracked,
} from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatTabsModule } from '@angular/material/tabs';
import { Title } from '@angular/platform-browser';
import { RouterLink } from '@angular/router';
import { renameBar } from '@shared/design';
import { refusalWords } from '@shared/checks';
import { kindOf } from '@shared/steps';
import { UnitsStore } from '../core/units/units-store';
import { WarningList } from '../ui/warning-list/warning-list';
import { DesignStore } from './design-store';
import { ShortcutsDialog } from './dialogs/shortcuts-dialog';
import { Drawing } from './drawing/drawing';
import { InAndOut } from './in-and-out/in-and-out';
import { BarWork } from './journey/bar-work';
import { Journey } from './journey/journey';
import { StepWork } from './journey/step-work';
import { DesignKeeper } from './keeping/design-keeper';
import { DraftWriter } from './keeping/draft-writer';
import { Opening } from './keeping/opening';
import { Trouble } from './keeping/trouble';
import { AssemblyPanel } from './panels/assembly-panel';
import { DesignPanel } from './panels/design-panel';
import { EffectPanel } from './panels/effect-panel';
import { StackPanel } from './panels/stack-panel';
import { StepPanel } from './panels/step-panel';
import { TextField } from './panels/text-field';
import { TopBar } from './top-bar/top-bar';
import { TotalsLine } from './totals/totals-line';
import { LayerWork } from './twin/layer-work';
import { keyCommand } from './key-command';

/** The editor: bar above, drawing and form side by side, the journey below. */
@Component({
  selector: 'lw-editor-page',
  imports: [
    AssemblyPanel,
    DesignPanel,
    Drawing,
    EffectPanel,
    Journey,
    MatButtonModule,
    MatTabsModule,
    RouterLink,
    StackPanel,
    StepPanel,
    TextField,
    TopBar,
    TotalsLine,
    WarningList,
  ],
  providers: [
    BarWork,
    DesignKeeper,
    DesignStore,
    DraftWriter,
    InAndOut,
    LayerWork,
    Opening,
    StepWork,
    Trouble,
  ],
  templateUrl: './editor-page.html',
  styleUrl: './editor-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: {
    '(document:keydown)': 'key($event)',
    '(window:beforeunload)': 'leaving($event)',
  },
})
export class EditorPage {
  /** Of a stored design, from the address; undefined for a visitor's draft. */
  readonly id = input<string>();

  protected readonly store = inject(DesignStore);
  protected readonly keeper = inject(DesignKeeper);
  protected readonly opening = inject(Opening);
  protected readonly trouble = inject(Trouble);
  private readonly units = inject(UnitsStore);
  private readonly dialog = inject(MatDialog);
  private readonly title = inject(Title);

  protected readonly selected = this.store.selected;
  protected readonly selectedName = computed(() => {
    const { bar, step } = this.selected();
    if (step) return kindOf(step).words.name;
    return bar.start.kind === 'stack' ? 'Stack' : 'Put together';
  });
  /** The form goes to the front when something else is selected. */
  protected readonly tab = linkedSignal({ source: this.store.selection, computation: () => 0 });
  protected readonly refusal = computed(() => {
    const { forged, step } = this.selected();
    const { refusal } = forged;
    return refusal && (refusal.step?.id ?? null) === (step?.id ?? null)
      ? refusalWords(refusal, this.store.design(), this.units.format())
      : null;
  });
  protected readonly warnings = computed(() => {
    const { barId, stepId } = this.store.selection();
    return this.store.warnings().filter((warning) => warning.bar === barId && warning.stepId === stepId);
  });

  constructor() {
    effect(() => {
      const id = this.id();
      untracked(() => this.opening.open(id));
    });
    effect(() => {
      if (this.opening.state().status === 'ready') {
        this.title.setTitle(`${this.store.design().name} · Layerwright`);
      }
    });
    // A conflict is shown when it comes about; if it is left open, the bar above says so.
    effect(() => {
      const state = this.keeper.state();
      if (state.kind === 'conflict' && state.theirs !== null) untracked(() => void this.trouble.seeTo());
    });
  }

  protected renameBar(name: string): void {
    const { id } = this.selected().bar;
    this.store.edit((design) => renameBar(design, id, name), `${id}.name`);
  }

  protected showShortcuts(): void {
    this.dialog.open(ShortcutsDialog, { width: '860px', maxWidth: '96vw', autoFocus: 'dialog' });
  }

  protected key(event: KeyboardEvent): void {
    if (this.opening.state().status !== 'ready' || this.dialog.openDialogs.length > 0) return;
    const command = keyCommand(event);
    if (command === null) return;
    event.preventDefault();
    if (command === 'undo') this.store.undo();
    else if (command === 'redo') this.store.redo();
    else this.showShortcuts();
  }

  protected leaving(event: BeforeUnloadEvent): void {
    if (this.opening.state().status === 'ready' && this.keeper.wouldLose()) event.preventDefault();
  }
}
