import { ChangeDetectionStrategy, Component, DestroyRef, computed, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatButtonModule } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInputModule } from '@angular/material/input';
import { MatProgressBarModule } from '@angular/material/progress-bar';
import { saveAs } from 'file-saver';
import { from, last, switchMap } from 'rxjs';
import { ComputeClient } from '../../core/compute/compute-client';
import { UnitsStore } from '../../core/units/units-store';
import { NumberField } from '../../ui/number-field/number-field';
import { type PictureSource, SAMPLES, orderOf } from './picture-source';
import {
  MOST_SAVED_PIXELS,
  SAVED_WIDTH,
  pictureFileName,
  pngOf,
  savedCanvas,
  savedLayout,
} from './saved-picture';

/** A picture to be saved. */
export interface SaveTask {
  readonly source: PictureSource;
  /** Of the design. */
  readonly name: string;
  readonly caption: string;
}

/** Saves the whole of a surface as a PNG, at a size of the reader's choice. */
@Component({
  selector: 'lw-save-dialog',
  imports: [
    MatButtonModule,
    MatDialogModule,
    MatFormFieldModule,
    MatInputModule,
    MatProgressBarModule,
    NumberField,
  ],
  templateUrl: './save-dialog.html',
  styleUrl: './save-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SaveDialog {
  protected readonly task = inject<SaveTask>(MAT_DIALOG_DATA);
  private readonly ref = inject<MatDialogRef<SaveDialog>>(MatDialogRef);
  private readonly client = inject(ComputeClient);
  private readonly units = inject(UnitsStore);
  private readonly destroyRef = inject(DestroyRef);

  protected readonly widths = SAVED_WIDTH;
  protected readonly mostWidthPx = Math.floor(
    Math.min(
      SAVED_WIDTH.max,
      Math.sqrt((MOST_SAVED_PIXELS * this.task.source.view.widthMm) / this.task.source.view.heightMm),
    ),
  );
  protected readonly widthPx = signal(Math.min(SAVED_WIDTH.usual, this.mostWidthPx));
  protected readonly caption = signal(this.task.caption);
  protected readonly isBusy = signal(false);
  protected readonly problem = signal<string | null>(null);

  private readonly layout = computed(() => {
    const { widthMm, heightMm } = this.task.source.view;
    return savedLayout(widthMm, heightMm, this.widthPx());
  });
  protected readonly sizeWords = computed(() => {
    const { widthPx, pictureHeightPx } = this.layout();
    const perMm = this.units.format().number(widthPx / this.task.source.view.widthMm, { digits: 1 });
    return `${widthPx} × ${pictureHeightPx} px and the caption; ${perMm} px for each mm`;
  });

  protected textOf(event: Event): string {
    return (event.target as HTMLTextAreaElement).value;
  }

  protected save(): void {
    const { source, name } = this.task;
    const layout = this.layout();
    const { widthMm } = source.view;
    const caption = this.caption();
    const format = this.units.format();
    this.isBusy.set(true);
    this.problem.set(null);
    this.client
      .picture({
        ...orderOf(source),
        widthPx: layout.widthPx,
        heightPx: layout.pictureHeightPx,
        samples: SAMPLES,
        lane: 'save',
        rank: 1,
      })
      .pipe(
        last(),
        switchMap((part) => from(savedCanvas(part, layout, widthMm, caption, format).then(pngOf))),
        takeUntilDestroyed(this.destroyRef),
      )
      .subscribe({
        next: (blob) => {
          saveAs(blob, pictureFileName(name, source.view.label));
          this.ref.close();
        },
        error: () => {
          this.isBusy.set(false);
          this.problem.set('The picture could not be made. Try a smaller one.');
        },
      });
  }
}
