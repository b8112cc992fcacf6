import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { type Design, STARTERS } from '@shared/design';
import { OPEN_PORT } from './compute-port';
import { PatternThumb } from './pattern-thumb';
import { type InlinePort, inlinePort } from './testing/inline-port';

const BAR = { lengthMm: 330, widthMm: 44, thicknessMm: 6 };
const LADDER = STARTERS.find(({ id }) => id === 'laddered')?.design as Design;

describe('PatternThumb', () => {
  let port: InlinePort;

  beforeEach(() => {
    port = inlinePort(true);
    TestBed.configureTestingModule({ providers: [{ provide: OPEN_PORT, useValue: port.open }] });
  });

  async function thumb(inputs: object = {}): Promise<ComponentFixture<PatternThumb>> {
    const fixture = TestBed.createComponent(PatternThumb);
    for (const [name, value] of Object.entries({ design: LADDER, bar: BAR, widthPx: 120, ...inputs })) {
      fixture.componentRef.setInput(name, value);
    }
    await drawn(fixture);
    return fixture;
  }

  async function drawn(fixture: ComponentFixture<PatternThumb>): Promise<void> {
    for (let turn = 0; turn < 200; turn++) {
      await fixture.whenStable();
      await new Promise((resolve) => setTimeout(resolve, 3));
      if (alphaInTheMiddle(fixture) > 0) break;
    }
  }

  function alphaInTheMiddle(fixture: ComponentFixture<PatternThumb>): number {
    const canvas = (fixture.nativeElement as HTMLElement).querySelector('canvas') as HTMLCanvasElement;
    const { width, height } = canvas;
    return canvas.getContext('2d')?.getImageData(width / 4, height / 2, 1, 1).data[3] ?? 0;
  }

  function orders(): number {
    return port.sent.filter(({ kind }) => kind === 'picture').length;
  }

  it('shows the blade where the design says one, in its proportions', async () => {
    const fixture = await thumb({ text: 'Ladder' });
    const host = fixture.nativeElement as HTMLElement;
    expect(alphaInTheMiddle(fixture)).toBe(255);
    expect(host.clientHeight).toBe(Math.round((120 * 42) / 280));
    expect(host.getAttribute('role')).toBe('img');
    expect(host.getAttribute('aria-label')).toBe('Ladder');
  });

  it('shows the top face of a state, and says nothing where the words stand beside it', async () => {
    const fixture = await thumb({ at: { bar: LADDER.result, state: 2 } });
    const host = fixture.nativeElement as HTMLElement;
    expect(host.clientHeight).toBe(16);
    expect(host.getAttribute('aria-hidden')).toBe('true');
    const [sent] = port.sent.flatMap((one) => (one.kind === 'picture' ? [one.payload] : []));
    expect(sent?.surface).toEqual({ kind: 'face', face: 'top', depthMm: 0.15 * 6 });
  });

  it('is made once for all who show the same', async () => {
    await thumb();
    await thumb();
    expect(orders()).toBe(1);
  });

  it('stays when an edit left its bar alone, and is made anew when the hammer changed', async () => {
    const like = {};
    const at = { bar: LADDER.result, state: 2 };
    await thumb({ like, at });
    await thumb({ like, at, design: { ...LADDER, name: 'Another' } });
    expect(orders()).toBe(1);
    await thumb({ like, at, design: { ...LADDER, unevenness: 0.5 } });
    expect(orders()).toBe(2);
  });

  it('stops its work when it goes', async () => {
    const fixture = TestBed.createComponent(PatternThumb);
    fixture.componentRef.setInput('design', LADDER);
    fixture.componentRef.setInput('bar', { ...BAR, lengthMm: 331 });
    fixture.componentRef.setInput('widthPx', 900);
    for (let turn = 0; turn < 200 && orders() === 0; turn++) {
      await fixture.whenStable();
      await new Promise((resolve) => setTimeout(resolve, 1));
    }
    fixture.destroy();
    await Promise.resolve();
    expect(port.sent.at(-1)?.kind).toBe('stop');
  });
});
