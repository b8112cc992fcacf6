import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  computed,
  inject,
  output,
  viewChild,
} from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MatIconModule } from '@angular/material/icon';
import { MatMenuModule } from '@angular/material/menu';
import { MatTooltipModule } from '@angular/material/tooltip';
import { RouterLink } from '@angular/router';
import { renameDesign } from '@shared/design';
import { DesignStore } from '../design-store';
import { InAndOut } from '../in-and-out/in-and-out';
import { DesignKeeper } from '../keeping/design-keeper';
import { needsReader } from '../keeping/keep-state';

/** The bar above the editor: name, saved state, undo and redo, print, file. */
@Component({
  selector: 'lw-top-bar',
  imports: [MatButtonModule, MatIconModule, MatMenuModule, MatTooltipModule, RouterLink],
  templateUrl: './top-bar.html',
  styleUrl: './top-bar.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TopBar {
  protected readonly store = inject(DesignStore);
  protected readonly keeper = inject(DesignKeeper);
  protected readonly inAndOut = inject(InAndOut);
  private readonly filePicker = viewChild.required<ElementRef<HTMLInputElement>>('file');

  /** The reader wants to see to what keeps the design from being saved. */
  readonly troubleOpen = output();
  readonly shortcutsOpen = output();

  protected readonly isVisitor = computed(() => this.keeper.state().kind === 'browser');
  protected readonly needsReader = computed(() => needsReader(this.keeper.state()));

  protected rename(event: Event): void {
    const name = (event.target as HTMLInputElement).value.trim();
    if (name !== '') this.store.edit((design) => renameDesign(design, name), 'name');
  }

  /** An empty name is none: the one before comes back. */
  protected leftName(event: Event): void {
    (event.target as HTMLInputElement).value = this.store.design().name;
    this.store.closeRun();
  }

  protected pickFile(): void {
    this.filePicker().nativeElement.click();
  }

  protected picked(event: Event): void {
    const input = event.target as HTMLInputElement;
    const file = input.files?.[0];
    input.value = '';
    if (file) void this.inAndOut.take(file);
  }
}
