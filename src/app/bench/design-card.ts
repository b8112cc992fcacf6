import {
  ChangeDetectionStrategy,
  Component,
  computed,
  type ElementRef,
  inject,
  input,
  output,
  viewChild,
} from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { MatTooltip } from '@angular/material/tooltip';
import { RouterLink } from '@angular/router';
import type { DesignListItem } from '../core/designs/designs-api';
import { UnitsStore } from '../core/units/units-store';
import { Moment } from './moment';

/** One design on the bench, as the title block of its drawing. */
@Component({
  selector: 'lw-design-card',
  imports: [MatIcon, MatIconButton, MatTooltip, Moment, RouterLink],
  templateUrl: './design-card.html',
  styleUrl: './design-card.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DesignCard {
  private readonly units = inject(UnitsStore);
  readonly design = input.required<DesignListItem>();
  /** Whether this browser has changes of it that the server does not have. */
  readonly isUnsaved = input(false);
  readonly copied = output();
  readonly deleted = output();

  private readonly link = viewChild.required<ElementRef<HTMLElement>>('link');

  protected readonly marks = computed(() => {
    const { revision, summary } = this.design();
    const bars = summary.bars > 1 ? `${this.units.format().count(summary.bars)} bars · ` : '';
    return `${bars}rev. ${revision}`;
  });
  protected readonly figures = computed(() => {
    const format = this.units.format();
    const { layers, startMassKg, endMassKg } = this.design().summary;
    return [
      { name: 'Layers', value: layers === null ? '–' : format.count(layers) },
      { name: 'Mass in', value: startMassKg === null ? '–' : format.mass(startMassKg) },
      { name: 'Mass out', value: endMassKg === null ? '–' : format.mass(endMassKg) },
    ];
  });

  /** Brings the keyboard to the link that opens the design. */
  focus(): void {
    this.link().nativeElement.focus();
  }
}
