import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { type Design, repeatedGroup, setLayers, type Stack } from '@shared/design';
import { DesignStore } from '../design-store';
import { STRAIGHT } from '../testing/designs';
import { provideEditorForSpec } from '../testing/provide-editor';
import { LayerGrid } from './layer-grid';
import { LayerGridHarness } from './testing/layer-grid-harness';

const FIVE = setLayers(STRAIGHT, 'billet', [
  { steel: '1084', thicknessMm: 1 },
  { steel: '15n20', thicknessMm: 2 },
  { steel: '1084', thicknessMm: 3 },
  { steel: '15n20', thicknessMm: 4 },
  { steel: '1084', thicknessMm: 5 },
]);

describe('LayerGrid', () => {
  async function given(design: Design = FIVE) {
    TestBed.configureTestingModule({ providers: [provideEditorForSpec()] });
    const store = TestBed.inject(DesignStore);
    store.open(design);
    const fixture = TestBed.createComponent(LayerGrid);
    const grid = await TestbedHarnessEnvironment.harnessForFixture(fixture, LayerGridHarness);
    const layers = () => (store.design().bars[0]?.start as Stack).layers;
    const order = () => layers().map((layer) => layer.thicknessMm);
    return { store, grid, layers, order };
  }

  it('lists the layers as they lie, the top one first', async () => {
    const { grid } = await given();
    expect(await grid.getRows()).toEqual([
      '5 1084 5 mm',
      '4 15N20 strip 4 mm',
      '3 1084 3 mm',
      '2 15N20 strip 2 mm',
      '1 1084 1 mm',
    ]);
    expect(await grid.getCurrent()).toBe('Layer 5 of 5, top, 1084');
  });

  it('goes from cell to cell and selects the layer', async () => {
    const { store, grid } = await given();
    await grid.press(TestKey.DOWN_ARROW);
    expect(store.selection().layers).toEqual(new Set([3]));
    await grid.press(TestKey.RIGHT_ARROW);
    expect(await grid.getCurrent()).toBe('Layer 4 of 5, 4 mm');
    expect(await grid.isFocused()).toBeTrue();
    await grid.press(TestKey.END, { control: true });
    expect(await grid.getCurrent()).toBe('Layer 1 of 5, bottom, 1 mm');
  });

  it('selects a run with Shift, single layers with Space, all with Control A', async () => {
    const { store, grid } = await given();
    await grid.press(TestKey.DOWN_ARROW);
    await grid.press(TestKey.DOWN_ARROW, { shift: true });
    expect(store.selection().layers).toEqual(new Set([3, 2]));
    await grid.press(' ');
    expect(store.selection().layers).toEqual(new Set([3]));
    await grid.press('a', { control: true });
    expect((await grid.getSelected()).length).toBe(5);
  });

  it('moves the selected layers with Alt and stays with them', async () => {
    const { grid, order, store } = await given();
    await grid.press(TestKey.DOWN_ARROW);
    await grid.press(TestKey.DOWN_ARROW, { alt: true });
    expect(order()).toEqual([1, 2, 4, 3, 5]);
    expect(await grid.getSelected()).toEqual(['3 15N20 strip 4 mm']);
    await grid.press(TestKey.UP_ARROW, { alt: true });
    await grid.press(TestKey.UP_ARROW, { alt: true });
    expect(order()).toEqual([1, 2, 3, 5, 4]);
    await grid.press(TestKey.UP_ARROW, { alt: true });
    expect(order()).toEqual([1, 2, 3, 5, 4]);
    store.undo();
    store.undo();
    store.undo();
    expect(store.design()).toBe(FIVE);
  });

  it('edits a thickness by Enter or by typing it', async () => {
    const { grid, order } = await given();
    await grid.press(TestKey.RIGHT_ARROW);
    await grid.press(TestKey.ENTER);
    expect(await grid.getEdited()).toBe('5');
    await grid.type('1/4');
    await grid.endEditing(TestKey.ENTER);
    // A quarter of an inch.
    expect(order()[4]).toBe(6.35);
    expect(await grid.isFocused()).toBeTrue();
    await grid.press('7');
    expect(await grid.getEdited()).toBe('7');
    await grid.endEditing(TestKey.ENTER);
    expect(order()[4]).toBe(7);
  });

  it('explains a thickness that can’t be read, keeps it, and takes it back on Escape', async () => {
    const { grid, order } = await given();
    await grid.press(TestKey.RIGHT_ARROW);
    await grid.press(TestKey.ENTER);
    await grid.type('thick');
    await grid.endEditing(TestKey.ENTER);
    expect(await grid.getRefusal()).toContain('thick');
    expect(await grid.getEdited()).toBe('thick');
    await grid.type('900');
    await grid.endEditing(TestKey.ENTER);
    expect(await grid.getRefusal()).toContain('500 mm');
    await grid.endEditing(TestKey.ESCAPE);
    expect(await grid.getRefusal()).toBeNull();
    expect(order()).toEqual([1, 2, 3, 4, 5]);
  });

  it('edits the thickness of all selected layers at once', async () => {
    const { grid, order } = await given();
    await grid.press(TestKey.RIGHT_ARROW);
    await grid.press('a', { control: true });
    await grid.press('2');
    await grid.endEditing(TestKey.ENTER);
    expect(order()).toEqual([2, 2, 2, 2, 2]);
  });

  it('changes a steel from the catalogue', async () => {
    const { grid, layers } = await given();
    await grid.press(TestKey.ENTER);
    await grid.chooseSteel(1);
    expect(layers()[4]?.steel).toBe('15n20');
    expect(await grid.isFocused()).toBeTrue();
  });

  it('lays a layer in and takes layers out', async () => {
    const { store, grid, order } = await given();
    await grid.press(TestKey.INSERT);
    expect(order()).toEqual([1, 2, 3, 4, 5, 5]);
    await grid.press(TestKey.DOWN_ARROW, { shift: true });
    await grid.press(TestKey.DELETE);
    expect(order()).toEqual([1, 2, 3, 4]);
    expect(await grid.isFocused()).toBeTrue();
    store.undo();
    store.undo();
    expect(store.design()).toBe(FIVE);
  });

  it('keeps the last layer', async () => {
    const { grid, order } = await given(setLayers(STRAIGHT, 'billet', [{ steel: '1084', thicknessMm: 1 }]));
    await grid.press(TestKey.DELETE);
    expect(order()).toEqual([1]);
  });

  it('has few rows in the page however many layers there are', async () => {
    const pair = [
      { steel: '1084', thicknessMm: 0.1 },
      { steel: '15n20', thicknessMm: 0.1 },
    ];
    const { grid } = await given(setLayers(STRAIGHT, 'billet', repeatedGroup(pair, 200, false)));
    expect((await grid.getRows()).length).toBeLessThan(60);
    await grid.press(TestKey.END, { control: true });
    // The view has to scroll there, which takes the browser a frame or two.
    await new Promise((resolve) => setTimeout(resolve, 100));
    expect(await grid.getCurrent()).toContain('Layer 1 of 400');
    expect(await grid.isFocused()).toBeTrue();
  });
});
