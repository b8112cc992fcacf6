import { ChangeDetectionStrategy, Component, signal } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import type { Stack } from '@shared/design';
import { CATALOGUE } from '@shared/steels';
import { formatFor } from '@shared/units';
import axe from 'axe-core';
import Konva from 'konva/lib/Core';
import { type GestureEnd, STEEL_DRAG_TYPE, type StackGesture } from './contract';
import { StackCanvas } from './stack-canvas';

const steels = new Map(CATALOGUE.map((steel) => [steel.id, steel]));
const thirteen: Stack = {
  kind: 'stack',
  lengthMm: 95,
  widthMm: 40,
  layers: Array.from({ length: 13 }, (_, i) =>
    i % 2 === 0 ? { steel: '1084', thicknessMm: 3 } : { steel: '15n20', thicknessMm: 2 },
  ),
};

@Component({
  imports: [StackCanvas],
  template: `
    @if (isShown()) {
      <lw-stack-canvas
        class="wide"
        [stack]="stack()"
        [steels]="steels"
        [format]="format"
        [stockThicknessesMm]="[2, 3, 4]"
        [(selected)]="selected"
        [(zoom)]="zoom"
        (gestureStart)="heard.push('start')"
        (gestureEdit)="edited($event)"
        (gestureEnd)="ended($event)"
      />
    }
  `,
  styles: '.wide { width: 800px; height: 500px }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Page {
  readonly isShown = signal(true);
  readonly stack = signal(thirteen);
  readonly selected = signal<ReadonlySet<number>>(new Set());
  readonly zoom = signal(1);
  readonly steels = steels;
  readonly format = formatFor('mm');
  readonly heard: string[] = [];

  edited(gesture: StackGesture): void {
    this.heard.push(
      gesture.kind === 'move'
        ? `move ${[...gesture.places].join(',')} to ${gesture.to}`
        : gesture.kind === 'thickness'
          ? `${gesture.place} is ${gesture.thicknessMm}`
          : `insert ${gesture.steel} at ${gesture.at}`,
    );
  }

  ended(end: GestureEnd): void {
    this.heard.push(end);
  }
}

describe('stack canvas', () => {
  let fixture: ComponentFixture<Page>;
  let page: Page;
  let sheet: HTMLElement;

  beforeEach(async () => {
    fixture = TestBed.createComponent(Page);
    page = fixture.componentInstance;
    document.body.append(fixture.nativeElement as HTMLElement);
    await fixture.whenStable();
    sheet = (fixture.nativeElement as HTMLElement).querySelector('.sheet') as HTMLElement;
    // A pointer of a spec's making can't be captured; what it does is sent to the sheet itself.
    spyOn(sheet, 'setPointerCapture');
  });

  async function pressed(key: string, keys: KeyboardEventInit = {}): Promise<KeyboardEvent> {
    const event = new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true, ...keys });
    sheet.dispatchEvent(event);
    await fixture.whenStable();
    return event;
  }

  function point(name: string, xPx: number, yPx: number): void {
    const box = sheet.getBoundingClientRect();
    sheet.dispatchEvent(
      new PointerEvent(name, {
        pointerId: 1,
        pointerType: 'mouse',
        button: 0,
        clientX: box.left + xPx,
        clientY: box.top + yPx,
        bubbles: true,
        cancelable: true,
      }),
    );
  }

  it('says what is drawn', () => {
    expect(sheet.tabIndex).toBe(0);
    const described = document.getElementById(sheet.getAttribute('aria-describedby') ?? '');
    expect(described?.textContent).toContain('Stack of 13 layers, 33 mm high, 40 mm wide, 95 mm long.');
    expect(described?.textContent).toContain('6 times 1084 3 mm and 15N20');
  });

  it('draws it: the middle of the first layer is the dark tone of 1084', () => {
    const canvas = sheet.querySelector('canvas') as HTMLCanvasElement;
    const context = canvas.getContext('2d') as CanvasRenderingContext2D;
    const counts = new Set<string>();
    const { data } = context.getImageData(canvas.width / 3, 0, 1, canvas.height);
    for (let i = 0; i < data.length; i += 4) counts.add(`${data[i]} ${data[i + 1]} ${data[i + 2]}`);
    // toneOf gives greys; the bright steel has no hatch, so its tone is there as it is.
    expect([...counts]).toContain('196 196 196');
  });

  it('goes through the layers by keys, and says where it is', async () => {
    await pressed('ArrowUp');
    expect([...page.selected()]).toEqual([0]);
    await pressed('ArrowUp', { shiftKey: true });
    expect([...page.selected()]).toEqual([0, 1]);
    await pressed('End');
    const said = (fixture.nativeElement as HTMLElement).querySelector('[aria-live]');
    expect(said?.textContent).toBe('Layer 13 of 13, 1084, 3 mm');
    const tab = await pressed('Tab');
    expect(tab.defaultPrevented).toBeFalse();
  });

  it('moves layers by Alt and arrow in one gesture', async () => {
    page.selected.set(new Set([2]));
    await fixture.whenStable();
    await pressed('ArrowUp', { altKey: true });
    expect(page.heard).toEqual(['start', 'move 2 to 4', 'settle']);
    expect([...page.selected()]).toEqual([3]);
  });

  it('zooms by key and button, within limits, and fits again', async () => {
    await pressed('+');
    expect(page.zoom()).toBeCloseTo(1.25, 9);
    await pressed('0');
    expect(page.zoom()).toBe(1);
    const out = (fixture.nativeElement as HTMLElement).querySelector<HTMLButtonElement>(
      '[aria-label="Zoom out"]',
    );
    for (let i = 0; i < 4; i++) {
      out?.click();
      await fixture.whenStable();
    }
    expect(page.zoom()).toBeCloseTo(0.5, 9);
    expect(out?.disabled).toBeTrue();
    page.zoom.set(1);
    await fixture.whenStable();
    expect(out?.disabled).toBeFalse();
  });

  it('carries a layer by pointer, and Escape leaves nothing of it', async () => {
    // 800 × 500 px: 33 mm are 406 px from y 34 to y 440, 12.3 px a millimetre; the first layer is 37 px high.
    point('pointerdown', 200, 424);
    point('pointermove', 210, 300);
    point('pointermove', 210, 60);
    await fixture.whenStable();
    expect(page.heard[0]).toBe('start');
    expect(page.heard[page.heard.length - 1]).toBe('move 0 to 12');
    await pressed('Escape');
    point('pointermove', 210, 300);
    point('pointerup', 210, 300);
    await fixture.whenStable();
    expect(page.heard[page.heard.length - 1]).toBe('abort');
    expect([...page.selected()]).toEqual([0]);
  });

  it('takes an undo in the middle of a gesture for its abort, and swallows it', async () => {
    point('pointerdown', 200, 424);
    point('pointermove', 210, 300);
    const undo = await pressed('z', { ctrlKey: true });
    expect(page.heard[page.heard.length - 1]).toBe('abort');
    expect(undo.defaultPrevented).toBeTrue();
    point('pointerup', 210, 300);
    const later = await pressed('z', { ctrlKey: true });
    expect(later.defaultPrevented).toBeFalse();
  });

  it('takes a steel from the catalogue, and nothing else', async () => {
    const box = sheet.getBoundingClientRect();
    const drag = (name: string, type: string): DragEvent => {
      const data = new DataTransfer();
      data.setData(type, '15n20');
      const at = { clientX: box.left + 200, clientY: box.top + 45 };
      const event = new DragEvent(name, { dataTransfer: data, bubbles: true, cancelable: true, ...at });
      sheet.dispatchEvent(event);
      return event;
    };
    expect(drag('dragover', 'text/plain').defaultPrevented).toBeFalse();
    expect(drag('dragover', STEEL_DRAG_TYPE).defaultPrevented).toBeTrue();
    drag('drop', STEEL_DRAG_TYPE);
    await fixture.whenStable();
    expect(page.heard).toEqual(['start', 'insert 15n20 at 13', 'settle']);
    expect([...page.selected()]).toEqual([13]);
  });

  it('has nothing that axe finds wrong', async () => {
    const { violations } = await axe.run(fixture.nativeElement as HTMLElement, {
      rules: { region: { enabled: false } },
    });
    expect(violations.map((violation) => violation.id)).toEqual([]);
  });

  it('gives back its canvases: fifty mounts leave no stage and no canvas behind', async () => {
    const stages = Konva.stages.length;
    const canvases = document.querySelectorAll('canvas').length;
    const made: HTMLCanvasElement[] = [];
    for (let i = 0; i < 50; i++) {
      page.isShown.set(false);
      await fixture.whenStable();
      page.isShown.set(true);
      await fixture.whenStable();
      made.push(...(fixture.nativeElement as HTMLElement).querySelectorAll('canvas'));
    }
    expect(Konva.stages.length).toBe(stages);
    expect(document.querySelectorAll('canvas').length).toBe(canvases);
    // Browsers keep the memory of a canvas until it is made small, however long it is gone.
    const gone = made.filter((canvas) => !canvas.isConnected);
    expect(gone.length).toBeGreaterThanOrEqual(49 * 2);
    expect(gone.every((canvas) => canvas.width === 0 && canvas.height === 0)).toBeTrue();
  });

  it('draws anew when the appearance changes', async () => {
    const canvas = sheet.querySelector('canvas') as HTMLCanvasElement;
    const pixels = (): string => canvas.toDataURL();
    const root = document.documentElement;
    const before = root.dataset['appearance'];
    root.dataset['appearance'] = 'light';
    await fixture.whenStable();
    await new Promise((resolve) => setTimeout(resolve));
    await fixture.whenStable();
    const light = pixels();
    root.dataset['appearance'] = 'dark';
    await new Promise((resolve) => setTimeout(resolve));
    await fixture.whenStable();
    expect(pixels()).not.toBe(light);
    if (before === undefined) delete root.dataset['appearance'];
    else root.dataset['appearance'] = before;
  });
});
