import { TestBed } from '@angular/core/testing';
import {
  editStep,
  removeStep,
  renameDesign,
  setStackSize,
  type Stack,
  insertLayers,
  removeLayers,
} from '@shared/design';
import { DesignStore } from './design-store';
import { STRAIGHT, starter } from './testing/designs';
import { provideEditorForSpec } from './testing/provide-editor';

describe('DesignStore', () => {
  let store: DesignStore;

  beforeEach(() => {
    TestBed.configureTestingModule({ providers: [provideEditorForSpec()] });
    store = TestBed.inject(DesignStore);
    store.open(STRAIGHT);
  });

  const length = () => (store.design().bars[0]?.start as Stack).lengthMm;
  const resize = (lengthMm: number, run?: string) =>
    store.edit((design) => setStackSize(design, 'billet', { lengthMm }), run);

  it('undoes and redoes every edit', () => {
    resize(100);
    store.edit((design) => renameDesign(design, 'Paring knife'));
    store.undo();
    expect(store.design().name).toBe(STRAIGHT.name);
    store.undo();
    expect(store.design()).toBe(STRAIGHT);
    expect(store.canUndo()).toBeFalse();
    store.redo();
    store.redo();
    expect([length(), store.design().name]).toEqual([100, 'Paring knife']);
    expect(store.canRedo()).toBeFalse();
  });

  it('makes one undo of a run of edits, and another of the next run', () => {
    resize(100, 'length');
    resize(101, 'length');
    resize(102, 'length');
    store.closeRun();
    resize(103, 'length');
    store.undo();
    expect(length()).toBe(102);
    store.undo();
    expect(store.design()).toBe(STRAIGHT);
  });

  it('closes a run when something else is edited', () => {
    resize(100, 'length');
    store.edit((design) => renameDesign(design, 'Paring knife'), 'name');
    store.undo();
    expect([length(), store.design().name]).toEqual([100, STRAIGHT.name]);
  });

  it('counts no edit that changes nothing', () => {
    resize(length());
    store.edit((design) => design);
    expect(store.canUndo()).toBeFalse();
  });

  it('applies each step of a gesture to where the gesture began', () => {
    store.beginGesture();
    for (const lengthMm of [10, 20, 30]) {
      store.gesture((design) => setStackSize(design, 'billet', { lengthMm: 95 + lengthMm }));
    }
    store.endGesture('settle');
    expect(length()).toBe(125);
    store.undo();
    expect(store.design()).toBe(STRAIGHT);
  });

  it('leaves document and redo as they were when a gesture is aborted', () => {
    resize(100);
    store.undo();
    store.beginGesture();
    store.gesture((design) => setStackSize(design, 'billet', { lengthMm: 50 }));
    store.endGesture('abort');
    expect(store.design()).toBe(STRAIGHT);
    store.redo();
    expect(length()).toBe(100);
  });

  it('works out anew only the step that was edited and those behind it', () => {
    const { bars } = store.design();
    const steps = bars[0]?.steps ?? [];
    const last = steps[steps.length - 1];
    const before = store.forging();
    store.edit((design) => editStep(design, 'billet', last?.id ?? '', { perEndMm: 12 }));
    expect(store.forging().stepsForged).toBe(1);
    expect(store.forging().bars[0]?.states[2]).toBe(before.bars[0]?.states[2]);
  });

  it('selects the start of what is opened', () => {
    expect(store.selection()).toEqual({ barId: 'billet', stepId: null, layers: new Set() });
    store.open(starter('san-mai'));
    expect(store.selection().barId).toBe('jacket');
    expect(store.selected().place).toBe(0);
  });

  it('falls back to the start when the selected step goes, and forgets layers that are gone', () => {
    const step = store.design().bars[0]?.steps[1]?.id ?? '';
    store.select('billet', step);
    expect(store.selected().place).toBe(2);
    store.edit((design) => removeStep(design, 'billet', step));
    expect(store.selection().stepId).toBeNull();
    store.edit((design) => insertLayers(design, 'billet', 13, [{ steel: '1084', thicknessMm: 2 }]));
    store.selectLayers(new Set([12, 13]));
    store.undo();
    expect(store.selection().layers).toEqual(new Set([12]));
  });

  it('lets layers be selected in a stack only', () => {
    store.open(starter('san-mai'));
    store.select('billet', null);
    store.selectLayers(new Set([0]));
    expect(store.selection().layers.size).toBe(0);
  });

  it('keeps its history over a reload', () => {
    resize(100);
    store.edit((design) => removeLayers(design, 'billet', new Set([0])));
    store.undo();
    const { past, present, future } = structuredClone(store.history());
    store.open(present, { past, future });
    expect(length()).toBe(100);
    store.redo();
    expect((store.design().bars[0]?.start as Stack).layers.length).toBe(12);
    store.undo();
    store.undo();
    expect(store.design()).toEqual(STRAIGHT);
  });
});
