import { type HarnessLoader, TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { MatCheckboxHarness } from '@angular/material/checkbox/testing';
import { MatFormFieldHarness } from '@angular/material/form-field/testing';
import { MatSelectHarness } from '@angular/material/select/testing';
import { insertStep } from '@shared/design';
import { STEP_KINDS, STEP_KIND_NAMES, type Step, type StepKindName } from '@shared/steps';
import { UnitsStore } from '../../core/units/units-store';
import { LengthFieldHarness } from '../../ui/length-field/testing/length-field-harness';
import { NumberFieldHarness } from '../../ui/number-field/testing/number-field-harness';
import { DesignStore } from '../design-store';
import { STRAIGHT } from '../testing/designs';
import { provideEditorForSpec } from '../testing/provide-editor';
import { StepPanel } from './step-panel';

describe('StepPanel', () => {
  /** A step of the kind, put in behind the first draw. */
  function given(kind: StepKindName) {
    TestBed.configureTestingModule({ providers: [provideEditorForSpec()] });
    const store = TestBed.inject(DesignStore);
    store.open(STRAIGHT);
    const bar = store.forging().bars[0]?.states[2]?.bar;
    if (!bar) throw new Error('no state');
    const step = { ...STEP_KINDS[kind].propose(bar), id: 'new' } as Step;
    store.open(insertStep(STRAIGHT, 'billet', 2, step));
    store.select('billet', 'new');
    const fixture = TestBed.createComponent(StepPanel);
    const loader: HarnessLoader = TestbedHarnessEnvironment.loader(fixture);
    const step_ = () => store.selected().step as Step;
    return { store, loader, step: step_ };
  }

  const length = (loader: HarnessLoader, label: string) =>
    loader.getHarness(LengthFieldHarness.with({ label }));
  const number = (loader: HarnessLoader, label: string) =>
    loader.getHarness(NumberFieldHarness.with({ label }));

  for (const kind of STEP_KIND_NAMES) {
    it(`draws a form for every field of ${kind}`, async () => {
      const { loader } = given(kind);
      const fields = await loader.getAllHarnesses(MatFormFieldHarness);
      const flags = await loader.getAllHarnesses(MatCheckboxHarness);
      // Heats, minutes, temperature and the note come with every step.
      expect(fields.length + flags.length).toBe(Object.keys(STEP_KINDS[kind].fields).length + 4);
      for (const field of fields) expect(await field.hasErrors()).toBeFalse();
    });
  }

  it('changes a length, a number, a choice and a flag', async () => {
    const { loader, step } = given('groove');
    await (await length(loader, 'Depth')).enter('1/8');
    expect(step()).toEqual(jasmine.objectContaining({ depthMm: 3.175 }));
    const [faces] = await loader.getAllHarnesses(MatSelectHarness);
    await faces?.clickOptions({ text: 'The top' });
    expect(step()).toEqual(jasmine.objectContaining({ faces: 'top' }));
    await (await number(loader, 'Heats')).enter('7');
    expect(step().heats).toBe(7);
  });

  it('takes an optional length away when its field is emptied, and shows what follows then', async () => {
    const { loader, step } = given('draw');
    const thickness = await length(loader, 'To thickness');
    await thickness.enter('');
    expect('thicknessMm' in step()).toBeFalse();
    expect(await thickness.getPlaceholder()).not.toBe('');
  });

  it('shows usual heat and time where none is given', async () => {
    const { loader } = given('weld');
    expect(await (await number(loader, 'Temperature')).getPlaceholder()).toBe('1200');
    expect(await (await number(loader, 'Minutes per heat')).getPlaceholder()).toBe('5');
  });

  it('takes temperatures in the reader’s degrees', async () => {
    const { loader, step } = given('weld');
    TestBed.inject(UnitsStore).choose('inch');
    const temperature = await number(loader, 'Temperature');
    expect(await temperature.getUnit()).toBe('°F');
    await temperature.enter('2192');
    // 2192 °F are 1200 °C.
    expect(step().temperatureC).toBe(1200);
    expect(await temperature.getText()).toBe('2192');
  });

  it('makes one undo of a run of arrow keys in one field', async () => {
    const { store, loader, step } = given('restack');
    const pieces = await number(loader, 'Pieces');
    for (let i = 0; i < 3; i++) await pieces.press(TestKey.UP_ARROW);
    expect(step()).toEqual(jasmine.objectContaining({ pieces: 7 }));
    store.undo();
    expect(step()).toEqual(jasmine.objectContaining({ pieces: 4 }));
  });
});
