import { ChangeDetectionStrategy, Component, computed, signal } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { type Assembly, type Design, STARTERS, barOf, setPieces } from '@shared/design';
import { evaluate } from '@shared/forging';
import { formatFor } from '@shared/units';
import axe from 'axe-core';
import { AssemblyCanvas } from './assembly-canvas';
import { BarsMapCanvas } from './bars-map';
import type { AssemblyGesture, GestureEnd } from './contract';

function starter(id: string): Design {
  const found = STARTERS.find((candidate) => candidate.id === id);
  if (found === undefined) throw new Error(`no starter ${id}`);
  return found.design;
}

@Component({
  imports: [AssemblyCanvas, BarsMapCanvas],
  template: `
    @if (forged(); as bar) {
      <lw-assembly-canvas
        class="wide"
        [assembly]="assembly()"
        [made]="bar.states[0]!.bar"
        [pieces]="bar.pieces"
        [overhangs]="bar.overhangs"
        [names]="names"
        [steels]="forging().steels"
        [format]="format"
        [(selected)]="piece"
        (gestureStart)="heard.push('start')"
        (gestureEdit)="edited($event)"
        (gestureEnd)="ended($event)"
      />
    }
    <lw-bars-map [design]="design()" [forging]="forging()" [format]="format" [(selected)]="bar" />
  `,
  styles: '.wide { width: 800px; height: 500px }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Page {
  readonly design = signal(starter('san-mai'));
  readonly forging = computed(() => evaluate(this.design()));
  readonly forged = computed(() => this.forging().bars.find((bar) => bar.id === 'billet'));
  readonly assembly = computed(() => barOf(this.design(), 'billet').start as Assembly);
  readonly names = new Map(starter('san-mai').bars.map((bar) => [bar.id, bar.name]));
  readonly piece = signal<number | null>(null);
  readonly bar = signal<string | null>('core');
  readonly format = formatFor('mm');
  readonly heard: string[] = [];

  edited(gesture: AssemblyGesture): void {
    this.heard.push(gesture.kind);
    if (gesture.kind !== 'turn') return;
    const pieces = this.assembly().pieces.map((piece, place) =>
      place === gesture.place ? { ...piece, quarterTurns: gesture.quarterTurns } : piece,
    );
    this.design.update((design) => setPieces(design, 'billet', pieces));
  }

  ended(end: GestureEnd): void {
    this.heard.push(end);
  }
}

describe('assembly canvas and map of bars', () => {
  let fixture: ComponentFixture<Page>;
  let page: Page;
  let host: HTMLElement;

  beforeEach(async () => {
    fixture = TestBed.createComponent(Page);
    page = fixture.componentInstance;
    host = fixture.nativeElement as HTMLElement;
    document.body.append(host);
    await fixture.whenStable();
  });

  async function pressed(key: string, keys: KeyboardEventInit = {}): Promise<void> {
    const sheet = host.querySelector('lw-assembly-canvas .sheet');
    sheet?.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true, ...keys }));
    await fixture.whenStable();
  }

  it('says what pieces lie where', () => {
    const sheet = host.querySelector('lw-assembly-canvas .sheet');
    const text = document.getElementById(sheet?.getAttribute('aria-describedby') ?? '')?.textContent ?? '';
    expect(text).toContain('End section of 3 pieces one on the other, 42 mm wide');
    expect(text).toContain(
      'From the bottom: Jacket, 42 × 10 mm; Core, 42 × 4.6 mm; Jacket, 42 × 10 mm, turned over.',
    );
  });

  it('turns and moves the chosen piece by keys and by buttons', async () => {
    await pressed('ArrowUp');
    await pressed('ArrowUp');
    expect(page.piece()).toBe(1);
    await pressed('r');
    expect(page.assembly().pieces[1]?.quarterTurns).toBe(1);
    const turn = [...host.querySelectorAll('button')].find(
      (button) => button.textContent.trim() === 'Turn a quarter',
    );
    turn?.click();
    await fixture.whenStable();
    expect(page.assembly().pieces[1]?.quarterTurns).toBe(2);
    await pressed('ArrowUp', { altKey: true });
    expect(page.piece()).toBe(2);
    expect(page.heard).toEqual([
      'start',
      'turn',
      'settle',
      'start',
      'turn',
      'settle',
      'start',
      'move',
      'settle',
    ]);
  });

  it('shows every bar on the map as a button that says what it is and where it goes', async () => {
    const bars = [...host.querySelectorAll<HTMLButtonElement>('lw-bars-map button')];
    expect(bars.map((bar) => bar.getAttribute('aria-pressed'))).toEqual(['false', 'true', 'false']);
    expect(bars[0]?.textContent).toContain('2 pieces go into Billet');
    expect(bars[2]?.textContent).toContain('the billet, an assembly of 3 pieces');
    bars[2]?.click();
    await fixture.whenStable();
    expect(page.bar()).toBe('billet');
  });

  it('has nothing that axe finds wrong', async () => {
    const { violations } = await axe.run(host, { rules: { region: { enabled: false } } });
    expect(violations.map((violation) => violation.id)).toEqual([]);
  });
});
