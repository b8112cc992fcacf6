import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { ChangeDetectionStrategy, Component, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { NumberField } from './number-field';
import { NumberFieldHarness } from './testing/number-field-harness';

@Component({
  imports: [NumberField],
  template: `<lw-number-field
    label="Heats"
    [value]="value()"
    [min]="0"
    [max]="50"
    [isWhole]="isWhole()"
    [isOptional]="isOptional()"
    [defaultValue]="5"
    [unit]="unit()"
    (valueChange)="take($event)"
  />`,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Host {
  readonly value = signal<number | undefined>(3);
  readonly isWhole = signal(true);
  readonly isOptional = signal(false);
  readonly unit = signal('');
  readonly taken: (number | undefined)[] = [];

  take(value: number | undefined): void {
    this.taken.push(value);
    this.value.set(value);
  }
}

describe('NumberField', () => {
  async function given() {
    const fixture = TestBed.createComponent(Host);
    const field = await TestbedHarnessEnvironment.loader(fixture).getHarness(NumberFieldHarness);
    return { host: fixture.componentInstance, field };
  }

  it('takes a number and steps by arrow key within its limits', async () => {
    const { host, field } = await given();
    await field.enter('4');
    expect(host.value()).toBe(4);
    await field.press(TestKey.UP_ARROW);
    expect(host.value()).toBe(5);
    await field.press(TestKey.DOWN_ARROW, true);
    expect(host.value()).toBe(0);
  });

  it('asks for a whole number where it must be one', async () => {
    const { host, field } = await given();
    await field.enter('2.5');
    expect(await field.getError()).toContain('whole');
    expect(await field.getText()).toBe('2.5');
    host.isWhole.set(false);
    await field.enter('2.5');
    expect(host.value()).toBe(2.5);
  });

  it('explains what is outside of the limits', async () => {
    const { host, field } = await given();
    host.unit.set('%');
    await field.enter('51');
    expect(await field.getError()).toContain('50 %');
    expect(host.taken).toEqual([]);
  });

  it('keeps the value behind a rounded figure when it was only looked at', async () => {
    const { host, field } = await given();
    host.isWhole.set(false);
    host.value.set(1 / 3);
    expect(await field.getText()).toBe('0.33');
    await field.enter('0.33');
    expect(host.taken).toEqual([]);
  });

  it('may be empty where that is allowed, and steps from what holds then', async () => {
    const { host, field } = await given();
    host.isOptional.set(true);
    await field.enter('');
    expect(host.value()).toBeUndefined();
    expect(await field.getPlaceholder()).toBe('5');
    await field.press(TestKey.UP_ARROW);
    expect(host.value()).toBe(6);
  });
});
