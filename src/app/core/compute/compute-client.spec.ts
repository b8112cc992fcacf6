import { TestBed } from '@angular/core/testing';
import type { Design } from '@shared/design';
import { alternating, billet } from '@shared/forging/testing/designs';
import { PLAIN_LOOK, USUAL_LOOK } from '@shared/pattern';
import { ComputeClient, type ComputeFailure, type PictureOrder } from './compute-client';
import { OPEN_PORT } from './compute-port';
import type { PicturePart } from './messages';
import type { Probe } from './probe';
import { type InlinePort, inlinePort } from './testing/inline-port';

const DESIGN: Design = billet(alternating(13), [
  { kind: 'weld', heats: 2 },
  { kind: 'draw', widthMm: 40, thicknessMm: 14 },
  { kind: 'restack', pieces: 4, turnAlternate: false },
]);

function order(change: Partial<PictureOrder> = {}): PictureOrder {
  return {
    design: DESIGN,
    surface: { kind: 'section', across: 'length', atMm: 20 },
    widthPx: 120,
    heightPx: 160,
    samples: 16,
    look: USUAL_LOOK,
    lane: 'view',
    rank: 0,
    ...change,
  };
}

/** What came of an order. */
interface Outcome {
  readonly parts: PicturePart[];
  end: 'open' | 'complete' | ComputeFailure;
  stop: () => void;
}

/** Whether two pictures have the same pixels. Matchers take minutes over so many numbers. */
function isSame(a: PicturePart | undefined, b: PicturePart | undefined): boolean {
  return a !== undefined && b !== undefined && a.pixels.every((value, i) => value === b.pixels[i]);
}

describe('ComputeClient', () => {
  let port: InlinePort;
  let client: ComputeClient;

  beforeEach(() => {
    port = inlinePort();
    TestBed.configureTestingModule({ providers: [{ provide: OPEN_PORT, useValue: port.open }] });
    client = TestBed.inject(ComputeClient);
  });

  function ordered(change: Partial<PictureOrder> = {}): Outcome {
    const outcome: Outcome = { parts: [], end: 'open', stop: () => subscription.unsubscribe() };
    const subscription = client.picture(order(change)).subscribe({
      next: (part) => outcome.parts.push(part),
      error: (error: ComputeFailure) => (outcome.end = error),
      complete: () => (outcome.end = 'complete'),
    });
    return outcome;
  }

  /** Lets messages through; with work, also everything that is to be done. */
  async function settle(works = true): Promise<void> {
    for (let turn = 0; turn < 4; turn++) {
      await Promise.resolve();
      if (works) port.runAll();
    }
    await Promise.resolve();
  }

  function stages(outcome: Outcome): readonly string[] {
    return outcome.parts.map((part) => part.stage);
  }

  it('gives a coarse picture first and finer ones after it, each whole', async () => {
    const outcome = ordered();
    await settle();
    expect(stages(outcome)).toEqual(['pixels', 'borders', 'finer', 'done']);
    expect(outcome.end).toBe('complete');
    const [coarse, , , done] = outcome.parts as [PicturePart, PicturePart, PicturePart, PicturePart];
    expect(coarse.pixels.length).toBe(4 * 120 * 160);
    expect(coarse.pixels.every((value, i) => i % 4 !== 3 || value === 255)).toBeTrue();
    // A sixteenth of the pixels is looked at before the first picture.
    expect(coarse.counters.samples).toBe((120 * 160) / 16);
    expect(done.counters.samples).toBeGreaterThan(120 * 160);
  });

  it('drops what is stale: a newer picture in the lane stops the older at its next portion', async () => {
    const older = ordered({ widthPx: 1200, heightPx: 1600 });
    await settle(false);
    expect(port.step()).toBeTrue();
    expect(port.step()).toBeTrue();
    const newer = ordered();
    await settle(false);
    const answered = port.answers.length;
    await settle();
    expect(older.end).toBe('complete');
    expect(stages(older)).not.toContain('done');
    expect(stages(newer)).toContain('done');
    // Not one answer to the older came after the newer was heard of.
    const stale = port.sent.find(({ kind }) => kind === 'picture')?.requestId;
    expect(port.answers.slice(answered).some(({ requestId }) => requestId === stale)).toBeFalse();
  });

  it('leaves other lanes alone, and does the lowest rank first', async () => {
    const thumb = ordered({ lane: 'thumb', rank: 5 });
    const view = ordered({ lane: 'view', rank: 0 });
    await settle();
    expect(stages(thumb)).toContain('done');
    expect(stages(view)).toContain('done');
    const [thumbId, viewId] = port.sent
      .filter(({ kind }) => kind === 'picture')
      .map((sent) => sent.requestId);
    const ids = port.answers.map(({ requestId }) => requestId);
    expect(ids.indexOf(thumbId as number)).toBeGreaterThan(ids.lastIndexOf(viewId as number));
  });

  it('stops working when nobody listens any more', async () => {
    const outcome = ordered({ widthPx: 1200, heightPx: 1600 });
    await settle(false);
    port.step();
    outcome.stop();
    await settle(false);
    port.step();
    expect(port.step()).toBeFalse();
    expect(outcome.end).toBe('open');
  });

  it('sends a design over once, however much is asked about it', async () => {
    ordered();
    await settle();
    ordered({ surface: { kind: 'face', face: 'top', depthMm: 2 } });
    client.probe({ ...order(), across: 0.5, up: 0.5 }).subscribe();
    await settle();
    expect(port.sent.filter(({ kind }) => kind === 'design').length).toBe(1);
    ordered({ design: { ...DESIGN, name: 'Another' } });
    await settle();
    expect(port.sent.filter(({ kind }) => kind === 'design').length).toBe(2);
  });

  it('keeps a limited number of designs over there, and gives back what is asked for again', async () => {
    for (let i = 0; i < 30; i++) {
      ordered({ design: { ...DESIGN, name: String(i) }, widthPx: 4, heightPx: 4, samples: 1 });
      await settle();
    }
    const known = (kind: string): number => port.sent.filter((sent) => sent.kind === kind).length;
    expect(known('design') - known('forget')).toBe(24);
    expect(port.answers.every(({ kind }) => kind === 'picture')).toBeTrue();
  });

  it('recolours without tracing anything', async () => {
    const first = ordered({ isKept: true });
    await settle();
    const second = ordered({ isKept: true, look: PLAIN_LOOK });
    await settle();
    expect(stages(second)).toEqual(['done']);
    expect(second.parts[0]?.counters).toEqual(first.parts.at(-1)?.counters as PicturePart['counters']);
    expect(isSame(second.parts[0], first.parts.at(-1))).toBeFalse();
  });

  it('recolours a picture that is not finished, and goes on with it', async () => {
    ordered({ isKept: true });
    await settle(false);
    port.step();
    const second = ordered({ isKept: true, look: PLAIN_LOOK });
    await settle();
    expect(stages(second)).toEqual(['pixels', 'borders', 'finer', 'done']);
    const whole = ordered({ lane: 'other', look: PLAIN_LOOK });
    await settle();
    expect(isSame(second.parts.at(-1), whole.parts.at(-1))).toBeTrue();
  });

  it('shows copper in grey when asked to, and everything else as before', async () => {
    const copper = billet(alternating(5, ['copper', '1084']), []);
    const coloured = ordered({ design: copper });
    await settle();
    const grey = ordered({ design: copper, isGrey: true });
    await settle();
    const isGrey = ({ pixels }: PicturePart): boolean =>
      pixels.every((value, i) => i % 4 === 3 || value === pixels[i - (i % 4)]);
    expect(isGrey(coloured.parts.at(-1) as PicturePart)).toBeFalse();
    expect(isGrey(grey.parts.at(-1) as PicturePart)).toBeTrue();
  });

  it('says so when a state doesn’t exist', async () => {
    const outcome = ordered({ at: { bar: 'billet', state: 9 } });
    await settle();
    expect((outcome.end as ComputeFailure).failure.code).toBe('no-state');
  });

  it('reports what broke, and starts anew with the next thing that is asked', async () => {
    const outcome = ordered();
    await settle(false);
    port.breakDown('out of memory');
    expect((outcome.end as ComputeFailure).failure).toEqual({ code: 'broken', message: 'out of memory' });
    const again = ordered();
    await settle();
    expect(again.end).toBe('complete');
    expect(port.sent.filter(({ kind }) => kind === 'design').length).toBe(2);
  });

  it('answers what lies under a place', async () => {
    const found: (Probe | null)[] = [];
    client
      .probe({ ...order(), at: { bar: 'billet', state: 0 }, across: 0.5, up: 4 / 33 })
      .subscribe((probe) => found.push(probe));
    await settle();
    expect(found.length).toBe(1);
    expect(found[0]?.steel).toBe('15n20');
    expect(found[0]?.place).toBe(1);
  });

  it('forgets a lane’s picture when it is released', async () => {
    const first = ordered({ isKept: true });
    await settle();
    client.release('view');
    const second = ordered({ isKept: true });
    await settle();
    expect(stages(second)).toEqual(stages(first));
  });
});

describe('ComputeClient with a real worker', () => {
  it('makes the same picture as in-line', async () => {
    const port = inlinePort(true);
    const parts = (): Promise<PicturePart> =>
      new Promise((resolve, reject) => {
        let last: PicturePart | undefined;
        TestBed.inject(ComputeClient)
          .picture(order())
          .subscribe({
            next: (part) => (last = part),
            error: reject,
            complete: () => resolve(last as PicturePart),
          });
      });
    const fromWorker = await parts();
    TestBed.resetTestingModule();
    TestBed.configureTestingModule({ providers: [{ provide: OPEN_PORT, useValue: port.open }] });
    const inline = await parts();
    expect(fromWorker.counters).toEqual(inline.counters);
    expect(isSame(fromWorker, inline)).toBeTrue();
  });
});
