import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { Figure } from './figure';
import { FigureHarness } from './testing/figure-harness';

describe('Figure', () => {
  async function given() {
    const fixture = TestBed.createComponent(Figure);
    fixture.componentRef.setInput('label', 'Length');
    fixture.componentRef.setInput('parts', { number: '211.4', unit: 'mm' });
    const figure = await TestbedHarnessEnvironment.harnessForFixture(fixture, FigureHarness);
    return { fixture, figure };
  }

  it('shows a figure with its unit', async () => {
    const { figure } = await given();
    expect(await figure.getLabel()).toBe('Length');
    expect(await figure.getValue()).toBe('211.4 mm');
  });

  it('says from what to what it changed', async () => {
    const { fixture, figure } = await given();
    fixture.componentRef.setInput('from', { number: '95', unit: 'mm' });
    expect(await figure.getValue()).toBe('from 95 → to 211.4 mm');
  });

  it('says nothing of what stayed the same', async () => {
    const { fixture, figure } = await given();
    fixture.componentRef.setInput('from', { number: '211.4', unit: 'mm' });
    expect(await figure.getValue()).toBe('211.4 mm');
  });

  it('names both units where they differ', async () => {
    const { fixture, figure } = await given();
    fixture.componentRef.setInput('parts', { number: '970', unit: 'g' });
    fixture.componentRef.setInput('from', { number: '1.02', unit: 'kg' });
    expect(await figure.getValue()).toBe('from 1.02 kg → to 970 g');
  });
});
