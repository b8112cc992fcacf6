import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { CATALOGUE } from '@shared/steels';
import { steelGroups } from './steel-groups';
import { SteelPicker } from './steel-picker';
import { SteelPickerHarness } from './testing/steel-picker-harness';

describe('SteelPicker', () => {
  async function given() {
    const fixture = TestBed.createComponent(SteelPicker);
    fixture.componentRef.setInput('label', 'Steel');
    fixture.componentRef.setInput('steelId', '1084');
    fixture.componentRef.setInput('steels', CATALOGUE);
    fixture.componentRef.setInput('atHand', ['15n20', '1084']);
    const chosen: string[] = [];
    fixture.componentInstance.steelIdChange.subscribe((id) => chosen.push(id));
    const picker = await TestbedHarnessEnvironment.harnessForFixture(fixture, SteelPickerHarness);
    return { picker, chosen };
  }

  it('names the steel that is chosen', async () => {
    const { picker } = await given();
    expect(await picker.getSteel()).toBe('1084');
  });

  it('offers every steel once, those at hand first', async () => {
    const { picker } = await given();
    const { groups, names } = await picker.getOffers();
    expect(groups[0]).toBe('In this design');
    expect(names.slice(0, 2)).toEqual(['15N20 strip', '1084']);
    expect(names.length).toBe(CATALOGUE.length);
  });

  it('tells which steel was taken', async () => {
    const { picker, chosen } = await given();
    await picker.choose('1095');
    expect(chosen).toEqual(['1095']);
  });
});

describe('steelGroups', () => {
  it('leaves no group empty', () => {
    const groups = steelGroups(CATALOGUE, [], 'At hand');
    expect(groups.every((group) => group.steels.length > 0)).toBeTrue();
    expect(groups.some((group) => group.label === 'At hand')).toBeFalse();
  });
});
