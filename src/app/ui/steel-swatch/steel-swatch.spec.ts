import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { HATCHES, type Steel, findSteel, toneOf } from '@shared/steels';
import { HATCH_PATHS, swatchBackground } from './hatch-path';
import { SteelSwatch } from './steel-swatch';
import { SteelSwatchHarness } from './testing/steel-swatch-harness';

describe('SteelSwatch', () => {
  it('shows a steel’s tone, and its hatch where it has one', async () => {
    const fixture = TestBed.createComponent(SteelSwatch);
    const steel = findSteel('1084') as Steel;
    fixture.componentRef.setInput('steel', steel);
    fixture.componentRef.setInput('hatch', 'cross');
    const swatch = await TestbedHarnessEnvironment.harnessForFixture(fixture, SteelSwatchHarness);
    const [red, green, blue] = toneOf(steel).rgb;
    expect(await swatch.getColour()).toBe(`rgb(${red}, ${green}, ${blue})`);
    expect(await swatch.isHatched()).toBeTrue();
    fixture.componentRef.setInput('hatch', 'plain');
    expect(await swatch.isHatched()).toBeFalse();
  });

  it('draws every hatch another way', () => {
    expect(new Set(Object.values(HATCH_PATHS)).size).toBe(HATCHES.length);
    const tone = toneOf(findSteel('1084') as Steel);
    expect(new Set(HATCHES.map((hatch) => swatchBackground(tone, hatch))).size).toBe(HATCHES.length);
  });
});
