import { ChangeDetectionStrategy, Component, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { STARTERS } from '@shared/design';
import { type ForgedState, evaluate } from '@shared/forging';
import { formatFor } from '@shared/units';
import { BarCanvas } from './bar-canvas';

@Component({
  imports: [BarCanvas],
  template: `
    <lw-bar-canvas
      class="wide"
      [state]="state()"
      [steels]="forging.steels"
      [format]="format"
      [overhangs]="billet.overhangs"
      [pieces]="billet.pieces"
    />
  `,
  styles: '.wide { width: 800px; height: 400px }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Page {
  readonly forging = evaluate(STARTERS[8]?.design as NonNullable<(typeof STARTERS)[number]>['design']);
  readonly billet = this.forging.bars[2] as (typeof this.forging.bars)[number];
  readonly state = signal(this.billet.states[0] as ForgedState);
  readonly format = formatFor('mm');
}

describe('bar canvas', () => {
  it('says what it shows: the pieces at the start, the bar after a step', async () => {
    const fixture = TestBed.createComponent(Page);
    const host = fixture.nativeElement as HTMLElement;
    document.body.append(host);
    await fixture.whenStable();
    const drawing = host.querySelector('lw-bar-canvas') as HTMLElement;
    expect(drawing.getAttribute('role')).toBe('img');
    expect(drawing.getAttribute('aria-label')).toContain('3 pieces one on the other.');
    expect(host.querySelectorAll('canvas').length).toBe(2);

    const page = fixture.componentInstance;
    page.state.set(page.billet.states[2] as ForgedState);
    await fixture.whenStable();
    const text = drawing.getAttribute('aria-label') ?? '';
    expect(text).toContain('45 mm wide, 8 mm thick');
    expect(text).not.toContain('pieces');
  });
});
