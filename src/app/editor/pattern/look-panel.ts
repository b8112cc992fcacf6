import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatSliderModule } from '@angular/material/slider';
import { type Look, USUAL_LOOK } from '@shared/pattern';

/** The knobs of a picture: how the surface is etched and finished, and how evenly it was forged. */
@Component({
  selector: 'lw-look-panel',
  imports: [MatButton, MatCheckbox, MatSliderModule],
  templateUrl: './look-panel.html',
  styleUrl: './look-panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LookPanel {
  readonly look = input.required<Look>();
  readonly isGrey = input.required<boolean>();
  /** 0–1, of the design. */
  readonly unevenness = input.required<number>();
  readonly lookChange = output<Look>();
  readonly isGreyChange = output<boolean>();
  readonly unevennessChange = output<number>();
  /** The slider of unevenness was let go: what follows is another edit. */
  readonly unevennessEnd = output();

  protected readonly knobs = [
    { name: 'etch', label: 'Etch', low: 'none', high: 'full contrast' },
    { name: 'relief', label: 'Relief', low: 'flat', high: 'deep' },
    { name: 'grit', label: 'Finish', low: 'polished', high: 'coarse belt' },
  ] as const;

  protected turn(name: keyof Look, percent: number): void {
    this.lookChange.emit({ ...this.look(), [name]: percent / 100 });
  }

  protected reset(): void {
    this.lookChange.emit(USUAL_LOOK);
    this.isGreyChange.emit(false);
  }
}
