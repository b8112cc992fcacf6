import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { type Design, editStep } from '@shared/design';
import { DesignStore } from '../design-store';
import { STRAIGHT, starter } from '../testing/designs';
import { provideEditorForSpec } from '../testing/provide-editor';
import { Journey } from './journey';
import { JourneyHarness } from './testing/journey-harness';

describe('Journey', () => {
  async function given(design: Design = STRAIGHT) {
    TestBed.configureTestingModule({ providers: [provideEditorForSpec()] });
    const store = TestBed.inject(DesignStore);
    store.open(design);
    const fixture = TestBed.createComponent(Journey);
    const journey = await TestbedHarnessEnvironment.harnessForFixture(fixture, JourneyHarness);
    const kinds = () => store.selected().bar.steps.map((step) => step.kind);
    return { store, journey, kinds };
  }

  it('shows the start and the bar after every step, with its size', async () => {
    const { journey } = await given();
    expect(await journey.getNames()).toEqual([
      'Stack',
      'Forge weld',
      'Draw out',
      'Restack',
      'Forge weld',
      'Draw out',
      'Trim the ends',
    ]);
    // 7 layers of 3.2 mm and 6 of 1.8 mm.
    expect((await journey.getSizes())[0]).toBe('95 × 40 × 33.2 mm');
    expect((await journey.getContents())[0]).toContain('13 layers');
  });

  it('selects what is clicked', async () => {
    const { store, journey } = await given();
    await journey.select(3);
    expect(store.selected().step?.kind).toBe('restack');
    expect(await journey.getSelected()).toBe(3);
  });

  it('goes along the strip by arrow keys, to its ends by Home and End', async () => {
    const { store, journey } = await given();
    await journey.press(0, TestKey.RIGHT_ARROW);
    await journey.press(1, TestKey.RIGHT_ARROW);
    expect(store.selected().step?.kind).toBe('draw');
    expect(await journey.isFocused(2)).toBeTrue();
    await journey.press(2, TestKey.END);
    expect(store.selected().step?.kind).toBe('trim');
    await journey.press(6, TestKey.HOME);
    expect(store.selected().step).toBeNull();
  });

  it('inserts a step at a seam: one that suits the bar there', async () => {
    const { store, journey, kinds } = await given();
    await journey.insertBehind(2, /^Twist/);
    expect(kinds()).toEqual(['weld', 'draw', 'twist', 'restack', 'weld', 'draw', 'trim']);
    expect(store.selected().step?.kind).toBe('twist');
    store.undo();
    expect(store.design()).toBe(STRAIGHT);
  });

  it('moves a step by key and by button alike', async () => {
    const byKey = await given();
    await byKey.journey.select(3);
    await byKey.journey.press(3, TestKey.LEFT_ARROW, true);
    expect(byKey.kinds()).toEqual(['weld', 'restack', 'draw', 'weld', 'draw', 'trim']);
    expect(await byKey.journey.isFocused(2)).toBeTrue();
    const moved = byKey.store.design();
    byKey.store.undo();
    await byKey.journey.select(3);
    await byKey.journey.pressButton('Move earlier');
    expect(byKey.store.design()).toEqual(moved);
    await byKey.journey.pressButton('Move earlier');
    expect(await byKey.journey.isButtonDisabled('Move earlier')).toBeTrue();
  });

  it('removes, duplicates and switches off', async () => {
    const { store, journey, kinds } = await given();
    await journey.select(6);
    await journey.press(6, TestKey.DELETE);
    expect(kinds()).toEqual(['weld', 'draw', 'restack', 'weld', 'draw']);
    await journey.pressButton('Duplicate the step');
    expect(kinds()).toEqual(['weld', 'draw', 'restack', 'weld', 'draw', 'draw']);
    await journey.pressButton('Switch the step off');
    expect(store.selected().step?.isOff).toBeTrue();
    await journey.pressButton('Switch the step on');
    expect(store.selected().step?.isOff).toBeUndefined();
    store.undo();
    store.undo();
    store.undo();
    store.undo();
    expect(store.design()).toBe(STRAIGHT);
  });

  it('never takes the start for a step', async () => {
    const { store, journey } = await given();
    await journey.press(0, TestKey.DELETE);
    expect(store.design()).toBe(STRAIGHT);
    expect(await journey.isButtonDisabled('Remove the step')).toBeTrue();
  });

  it('says in place why a step can’t be done, and keeps everything before it', async () => {
    const step = STRAIGHT.bars[0]?.steps[1]?.id ?? '';
    const impossible = editStep(STRAIGHT, 'billet', step, { lengthMm: 500, widthMm: 40, thicknessMm: 30 });
    const { journey } = await given(impossible);
    const reasons = await journey.getReasons();
    expect(reasons.length).toBe(5);
    // The field asked for and what the volume gives.
    expect(reasons[0]).toMatch(/To thickness.* asks for 30 mm/);
    expect(reasons[1]).toContain('Not computed');
    expect((await journey.getSizes()).length).toBe(2);
  });

  it('shows each bar and where it goes, and copies steps from one to another', async () => {
    const { store, journey } = await given(starter('san-mai'));
    expect(await journey.getBars()).toEqual(['Jacket', 'Core', 'Billet']);
    store.select('jacket', store.design().bars[0]?.steps[1]?.id ?? null);
    await journey.pressButton('Copy to another bar');
    await journey.chooseFromMenu(/From here on to Core/);
    expect(store.selected().bar.id).toBe('core');
    expect(store.selected().bar.steps.map((step) => step.kind)).toEqual(['grind', 'draw', 'grind']);
  });

  it('adds and removes bars', async () => {
    const { store, journey } = await given(starter('san-mai'));
    await journey.pressButton('More for Jacket');
    await journey.chooseFromMenu(/Duplicate/);
    expect(await journey.getBars()).toEqual(['Jacket', 'Jacket (copy)', 'Core', 'Billet']);
    await journey.pressButton('More for Jacket (copy)');
    await journey.chooseFromMenu(/Remove/);
    expect(store.design().bars.length).toBe(3);
  });
});
