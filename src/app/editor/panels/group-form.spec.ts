import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatCheckboxHarness } from '@angular/material/checkbox/testing';
import type { Layer } from '@shared/design';
import { CATALOGUE } from '@shared/steels';
import { formatFor } from '@shared/units';
import { NumberFieldHarness } from '../../ui/number-field/testing/number-field-harness';
import { SteelPickerHarness } from '../../ui/steel-picker/testing/steel-picker-harness';
import { provideEditorForSpec } from '../testing/provide-editor';
import { GroupForm } from './group-form';

describe('GroupForm', () => {
  const dark = { steel: '1084', thicknessMm: 3.2 };
  const bright = { steel: '15n20', thicknessMm: 1.8 };

  function given(stack: readonly Layer[]) {
    TestBed.configureTestingModule({ providers: [provideEditorForSpec()] });
    const fixture = TestBed.createComponent(GroupForm);
    fixture.componentRef.setInput('barId', 'billet');
    fixture.componentRef.setInput('stack', stack);
    fixture.componentRef.setInput('steels', CATALOGUE);
    fixture.componentRef.setInput('atHand', ['1084', '15n20']);
    fixture.componentRef.setInput('format', formatFor('mm'));
    const laid: (readonly Layer[])[] = [];
    fixture.componentInstance.layAnew.subscribe((layers) => laid.push(layers));
    const loader = TestbedHarnessEnvironment.loader(fixture);
    const outcome = async () => {
      await fixture.whenStable();
      const element = fixture.nativeElement as HTMLElement;
      return element.querySelector('.outcome')?.textContent.replace(/\s+/g, ' ').trim();
    };
    return { loader, laid, outcome };
  }

  it('begins with what the stack repeats', async () => {
    const { loader, outcome } = given([dark, bright, dark, bright, dark]);
    expect(await (await loader.getHarness(NumberFieldHarness)).getText()).toBe('2');
    expect(await (await loader.getHarness(MatCheckboxHarness)).isChecked()).toBeTrue();
    expect(await outcome()).toBe('5 layers, 13.2 mm high');
  });

  it('lays “1084 then 15N20, 7 times, end on 1084”: fifteen layers', async () => {
    const { loader, laid } = given([dark, bright, dark]);
    await (await loader.getHarness(NumberFieldHarness)).enter('7');
    await (await loader.getHarness(MatButtonHarness.with({ text: 'Replace the stack' }))).click();
    expect(laid[0]?.length).toBe(15);
    expect(laid[0]?.[0]).toEqual(dark);
    expect(laid[0]?.[14]).toEqual(dark);
    expect(laid[0]?.[1]).toEqual(bright);
  });

  it('lays groups of more than two', async () => {
    const { loader, laid } = given([dark, bright]);
    await (await loader.getHarness(MatButtonHarness.with({ text: /Add to the group/ }))).click();
    const pickers = await loader.getAllHarnesses(SteelPickerHarness);
    expect(pickers.length).toBe(3);
    await pickers[2]?.choose('1095');
    await (await loader.getHarness(MatButtonHarness.with({ text: 'Replace the stack' }))).click();
    expect(laid[0]?.map((layer) => layer.steel)).toEqual(['1084', '15n20', '1095']);
  });

  it('lays no more layers than a stack holds', async () => {
    const { loader, outcome } = given([dark, bright]);
    await (await loader.getHarness(NumberFieldHarness)).enter('300');
    expect(await outcome()).toContain('400 at most');
    const lay = await loader.getHarness(MatButtonHarness.with({ text: 'Replace the stack' }));
    expect(await lay.isDisabled()).toBeTrue();
  });
});
