import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MatButtonToggleModule } from '@angular/material/button-toggle';
import { MatCheckboxModule } from '@angular/material/checkbox';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatIconModule } from '@angular/material/icon';
import { MatSelectModule } from '@angular/material/select';
import { type Assembly, MAX_PIECES, type Piece } from '@shared/design';
import { UnitsStore } from '../../core/units/units-store';
import { DesignStore } from '../design-store';
import { editPiece, insertPiece, movePiece, removePiece, setAlong } from '../document-edits';

/** Quarter turns of a piece, as they are chosen. */
const TURNS: readonly { readonly value: 0 | 1 | 2 | 3; readonly label: string }[] = [
  { value: 0, label: 'As it lies' },
  { value: 1, label: '¼: top to the right' },
  { value: 2, label: '½: turned over' },
  { value: 3, label: '¾: top to the left' },
];

/** The form of an assembly: which pieces, in which order, turned how. */
@Component({
  selector: 'lw-assembly-panel',
  imports: [
    MatButtonModule,
    MatButtonToggleModule,
    MatCheckboxModule,
    MatFormFieldModule,
    MatIconModule,
    MatSelectModule,
  ],
  templateUrl: './assembly-panel.html',
  styleUrls: ['./panel.scss', './assembly-panel.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AssemblyPanel {
  protected readonly store = inject(DesignStore);
  protected readonly units = inject(UnitsStore);

  protected readonly turns = TURNS;
  protected readonly bar = computed(() => this.store.selected().bar);
  protected readonly assembly = computed(() => this.bar().start as Assembly);
  /** Bars that may be laid in: those before this one. */
  protected readonly earlier = computed(() => {
    const { bars } = this.store.design();
    return bars.slice(
      0,
      bars.findIndex((bar) => bar.id === this.bar().id),
    );
  });
  protected readonly hasRoom = computed(() => this.assembly().pieces.length < MAX_PIECES);
  protected readonly endWords = computed(() =>
    this.assembly().along === 'thickness' ? 'the bottom one first' : 'the left one first',
  );

  /** What of a piece sticks out and is trimmed; empty if nothing does. */
  protected readonly overhangs = computed((): readonly string[] => {
    const format = this.units.format();
    const across = this.assembly().along === 'thickness' ? 'width' : 'thickness';
    return this.store
      .selected()
      .forged.overhangs.map(({ lengthMm, acrossMm }) =>
        [
          lengthMm > 0 ? `${format.length(lengthMm)} of its length` : '',
          acrossMm > 0 ? `${format.length(acrossMm)} of its ${across}` : '',
        ]
          .filter(Boolean)
          .join(' and '),
      );
  });

  protected setAlong(along: Assembly['along']): void {
    this.store.edit((design) => setAlong(design, this.bar().id, along));
  }

  protected change(place: number, change: Partial<Piece>): void {
    this.store.edit((design) => editPiece(design, this.bar().id, place, change));
  }

  protected moveBy(place: number, by: 1 | -1): void {
    this.store.edit((design) => movePiece(design, this.bar().id, place, by === 1 ? place + 2 : place - 1));
  }

  protected remove(place: number): void {
    this.store.edit((design) => removePiece(design, this.bar().id, place));
  }

  protected add(): void {
    const { pieces } = this.assembly();
    const last = pieces[pieces.length - 1] as Piece;
    this.store.edit((design) => insertPiece(design, this.bar().id, pieces.length, last));
  }
}
