import { type HarnessLoader } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { MatSliderHarness } from '@angular/material/slider/testing';
import { evaluate } from '@shared/forging';
import { OPEN_PORT } from '../../core/compute/compute-port';
import type { PictureTask } from '../../core/compute/messages';
import { type InlinePort, inlinePort } from '../../core/compute/testing/inline-port';
import { LOCAL_STORAGE } from '../../core/settings/settings';
import { READER_LOCALE } from '../../core/settings/reader-locale';
import { MemoryStorage } from '../../core/testing/memory-storage';
import { STRAIGHT } from '../testing/designs';
import { PatternView } from './pattern-view';
import { SESSION_STORAGE } from './sight';

const BAR = STRAIGHT.bars[0];
const STATES = evaluate(STRAIGHT).bars[0]?.states ?? [];
/** After the second draw: 354 × 40 × 7 mm. */
const DRAWN = 5;

describe('PatternView', () => {
  let port: InlinePort;
  let storage: MemoryStorage;
  let fixture: ComponentFixture<PatternView>;
  let loader: HarnessLoader;

  beforeEach(async () => {
    port = inlinePort(true);
    storage = new MemoryStorage();
    TestBed.configureTestingModule({
      providers: [
        { provide: OPEN_PORT, useValue: port.open },
        { provide: SESSION_STORAGE, useValue: storage },
        { provide: LOCAL_STORAGE, useValue: new MemoryStorage() },
        { provide: READER_LOCALE, useValue: 'en-GB' },
      ],
    });
    await create();
  });

  async function create(): Promise<void> {
    fixture = TestBed.createComponent(PatternView);
    loader = TestbedHarnessEnvironment.loader(fixture);
    fixture.componentRef.setInput('design', STRAIGHT);
    fixture.componentRef.setInput('at', { bar: BAR?.id, state: DRAWN });
    fixture.componentRef.setInput('bar', STATES[DRAWN]?.bar);
    fixture.componentRef.setInput('moment', 'after Draw out');
    fixture.componentRef.setInput('isResult', false);
    const host = fixture.nativeElement as HTMLElement;
    host.style.width = '600px';
    host.style.height = '400px';
    await settled();
  }

  /** Until the last picture asked for is finished. */
  async function settled(): Promise<void> {
    for (let turn = 0; turn < 400; turn++) {
      await fixture.whenStable();
      await new Promise((resolve) => setTimeout(resolve, 2));
      const last = tasks().at(-1);
      const done = port.answers.some(
        (answer) =>
          answer.kind === 'picture' && answer.requestId === last?.id && answer.payload.stage === 'done',
      );
      if (done && turn > 3) break;
    }
    await fixture.whenStable();
  }

  function tasks(): readonly { readonly id: number; readonly task: PictureTask }[] {
    return port.sent.flatMap((sent) =>
      sent.kind === 'picture' ? [{ id: sent.requestId, task: sent.payload }] : [],
    );
  }

  function element<E extends HTMLElement>(selector: string): E {
    const found = (fixture.nativeElement as HTMLElement).querySelector<E>(selector);
    if (found === null) throw new Error(`There is no ${selector}.`);
    return found;
  }

  async function choose(view: string): Promise<void> {
    const select = element<HTMLSelectElement>('select');
    select.value = view;
    select.dispatchEvent(new Event('change'));
    await settled();
  }

  async function press(key: string, times = 1): Promise<void> {
    for (let i = 0; i < times; i++) {
      element('.sheet').dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true }));
    }
    await settled();
    await settled();
  }

  it('shows the top face of the state, a little ground, and says so', () => {
    expect(tasks().at(-1)?.task.surface).toEqual({ kind: 'face', face: 'top', depthMm: 1 });
    expect(tasks().at(-1)?.task.at).toEqual({ bar: 'billet', state: DRAWN });
    expect(element('.sheet').getAttribute('aria-label')).toMatch(
      /^Top face ground 1 mm deep, 353\.\d × 40 mm: Billet after Draw out, 52 layers of 15N20 strip \(bright\) and 1084 \(dark\)\.$/,
    );
    const canvas = element<HTMLCanvasElement>('canvas');
    const { data } = canvas
      .getContext('2d')
      ?.getImageData(canvas.width / 2, canvas.height / 2, 1, 1) as ImageData;
    expect(data[3]).withContext('metal in the middle').toBe(255);
  });

  it('changes what is seen and remembers it for the session', async () => {
    await choose('cross');
    expect(tasks().at(-1)?.task.surface.kind).toBe('section');
    fixture.destroy();
    TestBed.resetTestingModule();
    TestBed.configureTestingModule({
      providers: [
        { provide: OPEN_PORT, useValue: port.open },
        { provide: SESSION_STORAGE, useValue: storage },
        { provide: LOCAL_STORAGE, useValue: new MemoryStorage() },
        { provide: READER_LOCALE, useValue: 'en-GB' },
      ],
    });
    await create();
    expect(element<HTMLSelectElement>('select').value).toBe('cross');
  });

  it('grinds deeper by the slider', async () => {
    const slider = await loader.getHarness(MatSliderHarness);
    await (await slider.getEndThumb()).setValue(3);
    await settled();
    expect(tasks().at(-1)?.task.surface).toEqual({ kind: 'face', face: 'top', depthMm: 3 });
    expect(element('output').textContent).toBe('3 mm');
  });

  it('tells by keyboard what lies under the crosshair', async () => {
    await choose('cross');
    await press('ArrowUp');
    const spoken = element('lw-picture-sheet [aria-live]').textContent;
    expect(spoken).toMatch(
      /^(1084|15N20 strip), layer \d+ of 13, band 0\.\d+ mm\. 176\.\d mm along, 20 mm across, /,
    );
    expect(element('.probe').textContent).toContain('of 13');
    expect(element('.mark')).toBeTruthy();
    await press('Escape');
    expect(element('lw-picture-sheet [aria-live]').textContent).toBe('');
  });

  it('zooms by keyboard: fewer millimetres on as many pixels, the scale bar with it', async () => {
    const before = tasks().at(-1)?.task.window;
    const label = element('.scale').textContent;
    await press('+', 6);
    const after = tasks().at(-1)?.task.window;
    expect((after?.right ?? 1) - (after?.left ?? 0)).toBeLessThan(
      0.5 * ((before?.right ?? 0) - (before?.left ?? 0)),
    );
    expect(element('.scale').textContent).not.toBe(label);
    await press('0');
    expect(tasks().at(-1)?.task.window).toEqual(before);
  });

  it('recolours without tracing anything anew', async () => {
    element<HTMLButtonElement>('[aria-label="Etch and finish"]').click();
    await fixture.whenStable();
    const root = TestbedHarnessEnvironment.documentRootLoader(fixture);
    const etch = await root.getHarness(MatSliderHarness.with({ ancestor: 'lw-look-panel' }));
    await (await etch.getEndThumb()).setValue(40);
    await settled();
    const { id, task } = tasks().at(-1) as { id: number; task: PictureTask };
    expect(task.look.etch).toBe(0.4);
    const answers = port.answers.filter(({ requestId }) => requestId === id);
    expect(answers.length).toBe(1);
    expect(JSON.parse(storage.getItem('layerwright.surface') ?? '{}').look.etch).toBe(0.4);
  });

  it('says when there is no such state, and when the worker broke', async () => {
    fixture.componentRef.setInput('at', { bar: 'billet', state: 40 });
    await settled();
    expect(element('.failure').textContent).toContain('no such state');
    fixture.componentRef.setInput('at', { bar: 'billet', state: DRAWN });
    await fixture.whenStable();
    port.breakDown('gone');
    await fixture.whenStable();
    expect(element('.failure').textContent).toContain('could not be made');
    element<HTMLButtonElement>('.failure button').click();
    await settled();
    expect((fixture.nativeElement as HTMLElement).querySelector('.failure')).toBeNull();
  });

  it('stops and frees its work when it goes', async () => {
    fixture.destroy();
    await Promise.resolve();
    expect(port.sent.at(-1)?.kind).toBe('release');
  });
});
