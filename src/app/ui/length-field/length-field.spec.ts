import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { ChangeDetectionStrategy, Component, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import type { UnitSystem } from '@shared/units';
import { LengthField } from './length-field';
import { LengthFieldHarness } from './testing/length-field-harness';

@Component({
  imports: [LengthField],
  template: `<lw-length-field
    label="Thickness"
    [valueMm]="mm()"
    [system]="system()"
    [minMm]="0.1"
    [maxMm]="500"
    [isOptional]="isOptional()"
    [defaultMm]="0.5"
    (valueMmChange)="take($event)"
  />`,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Host {
  readonly mm = signal<number | undefined>(2.4);
  readonly system = signal<UnitSystem>('mm');
  readonly isOptional = signal(false);
  readonly taken: (number | undefined)[] = [];

  take(mm: number | undefined): void {
    this.taken.push(mm);
    this.mm.set(mm);
  }
}

describe('LengthField', () => {
  async function given() {
    const fixture = TestBed.createComponent(Host);
    const field = await TestbedHarnessEnvironment.loader(fixture).getHarness(LengthFieldHarness);
    return { host: fixture.componentInstance, field, fixture };
  }

  it('shows the length in the reader’s units', async () => {
    const { host, field } = await given();
    expect(await field.getText()).toBe('2.4');
    expect(await field.getUnit()).toBe('mm');
    host.mm.set((3 * 25.4) / 32);
    host.system.set('inch');
    expect(await field.getText()).toBe('3/32');
    expect(await field.getUnit()).toBe('in');
  });

  // The definition of the inch: 3/32 in is 2.38125 mm, 0.094 in is 2.3876 mm.
  for (const [text, mm] of [
    ['3/32', 2.38125],
    ['3/32"', 2.38125],
    ['0.094 in', 2.3876],
    ['2.5 mm', 2.5],
    ['2,5', 2.5],
  ] as const) {
    it(`takes ${text}`, async () => {
      const { host, field } = await given();
      await field.enter(text);
      expect(host.mm()).toBeCloseTo(mm, 12);
      expect(await field.getError()).toBeNull();
    });
  }

  it('explains a wrong entry and keeps it', async () => {
    const { host, field } = await given();
    await field.enter('three');
    expect(await field.getText()).toBe('three');
    expect(await field.getError()).toContain('three');
    expect(host.taken).toEqual([]);
    await field.enter('3');
    expect(await field.getError()).toBeNull();
    expect(host.mm()).toBe(3);
  });

  it('keeps a wrong entry when the units are switched', async () => {
    const { host, field } = await given();
    await field.enter('three');
    host.system.set('inch');
    expect(await field.getText()).toBe('three');
  });

  it('says what the limits are', async () => {
    const { host, field } = await given();
    await field.enter('800');
    expect(await field.getError()).toContain('500 mm');
    await field.enter('0.05');
    expect(await field.getError()).toContain('0.1 mm');
    expect(host.taken).toEqual([]);
  });

  it('leaves a length as it is when it was only looked at in other units', async () => {
    const { host, field } = await given();
    host.system.set('inch');
    const text = await field.getText();
    await field.enter(text);
    expect(host.taken).toEqual([]);
  });

  it('steps by arrow key, ten times as far with Shift', async () => {
    const { host, field } = await given();
    await field.press(TestKey.UP_ARROW);
    expect(host.mm()).toBe(2.5);
    expect(await field.getText()).toBe('2.5');
    await field.press(TestKey.DOWN_ARROW);
    await field.press(TestKey.UP_ARROW, true);
    expect(host.mm()).toBe(3.4);
  });

  it('stays within its limits when stepping', async () => {
    const { host, field } = await given();
    host.mm.set(0.1);
    await field.press(TestKey.DOWN_ARROW);
    expect(host.mm()).toBe(0.1);
  });

  it('takes back what was typed on Escape', async () => {
    const { host, field } = await given();
    await field.type('77');
    await field.press(TestKey.ESCAPE);
    await field.leave();
    expect(await field.getText()).toBe('2.4');
    expect(host.taken).toEqual([]);
  });

  it('takes effect when typing rests, without touching the text', async () => {
    jasmine.clock().install();
    try {
      const { host, field } = await given();
      await field.type('3.0');
      jasmine.clock().tick(400);
      expect(host.mm()).toBe(3);
      expect(await field.getText()).toBe('3.0');
      await field.leave();
      expect(await field.getText()).toBe('3');
    } finally {
      jasmine.clock().uninstall();
    }
  });

  it('shows the value that comes from elsewhere, undo say', async () => {
    const { host, field } = await given();
    await field.enter('9');
    host.mm.set(2.4);
    expect(await field.getText()).toBe('2.4');
  });

  it('may be empty where that is allowed, and says what holds then', async () => {
    const { host, field } = await given();
    await field.enter('');
    expect(await field.getError()).not.toBeNull();
    host.isOptional.set(true);
    await field.enter('');
    expect(host.mm()).toBeUndefined();
    expect(await field.getPlaceholder()).toBe('0.5');
    await field.press(TestKey.UP_ARROW);
    expect(host.mm()).toBe(0.6);
  });
});
