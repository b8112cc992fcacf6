import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import type { Warning } from '@shared/checks';
import { WarningListHarness } from './testing/warning-list-harness';
import { WarningList } from './warning-list';

const thin: Warning = {
  code: 'bands-thin',
  severity: 'caution',
  bar: 'billet',
  stepId: 'draw',
  message: 'The thinnest band is 0.015 mm.',
  remedy: 'Draw it less.',
  values: {},
  source: 'Common practice, no source',
};

describe('WarningList', () => {
  async function given() {
    const fixture = TestBed.createComponent(WarningList);
    fixture.componentRef.setInput('warnings', [{ ...thin, severity: 'stop', message: 'No.' }, thin]);
    const list = await TestbedHarnessEnvironment.harnessForFixture(fixture, WarningListHarness);
    return { fixture, list };
  }

  it('says how grave each is, in words', async () => {
    const { list } = await given();
    expect(await list.getMessages()).toEqual(['Stop. No.', 'Caution. The thinnest band is 0.015 mm.']);
    expect(await list.getSources()).toEqual([thin.source, thin.source]);
  });

  it('leads to the place where asked to', async () => {
    const { fixture, list } = await given();
    expect(await list.getPlaces()).toEqual([]);
    fixture.componentRef.setInput('placeWords', (warning: Warning) => `Go to ${warning.stepId ?? 'start'}`);
    const opened: Warning[] = [];
    fixture.componentInstance.placeOpen.subscribe((warning) => opened.push(warning));
    expect(await list.getPlaces()).toEqual(['Go to draw', 'Go to draw']);
    await list.openPlace(1);
    expect(opened).toEqual([thin]);
  });
});
