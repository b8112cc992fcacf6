import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatCheckboxModule } from '@angular/material/checkbox';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatSelectModule } from '@angular/material/select';
import { editStep } from '@shared/design';
import { type Step, kindOf } from '@shared/steps';
import { celsiusOf, fahrenheitOf } from '@shared/units';
import { UnitsStore } from '../../core/units/units-store';
import { LengthField } from '../../ui/length-field/length-field';
import { NumberField } from '../../ui/number-field/number-field';
import { DesignStore } from '../design-store';
import { stepFieldsOf } from './step-fields';
import { TextField } from './text-field';

type FieldValue = number | string | boolean | undefined;

/** The form of the selected step, drawn from the fields of its kind and from those that every step has. */
@Component({
  selector: 'lw-step-panel',
  imports: [LengthField, MatCheckboxModule, MatFormFieldModule, MatSelectModule, NumberField, TextField],
  templateUrl: './step-panel.html',
  styleUrl: './panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(focusout)': 'store.closeRun()' },
})
export class StepPanel {
  protected readonly store = inject(DesignStore);
  protected readonly units = inject(UnitsStore);

  protected readonly step = computed(() => this.store.selected().step as Step);
  protected readonly kind = computed(() => kindOf(this.step()));
  protected readonly fields = computed(() => {
    const { forged, place } = this.store.selected();
    return stepFieldsOf(this.step(), forged.states[place] ?? null, this.store.forging().allowances);
  });

  /** Temperatures are typed in the reader's degrees. */
  protected readonly degrees = computed(() => {
    const isMetric = this.units.system() === 'mm';
    const shown = (temperatureC: number): number =>
      isMetric ? temperatureC : Math.round(fahrenheitOf(temperatureC));
    const { weldTemperatureC, forgeTemperatureC } = this.store.forging().allowances;
    const { temperatureC } = this.step();
    return {
      unit: isMetric ? '°C' : '°F',
      value: temperatureC === undefined ? undefined : shown(temperatureC),
      usual: shown(this.step().kind === 'weld' ? weldTemperatureC : forgeTemperatureC),
      max: shown(1400),
      step: isMetric ? 10 : 25,
    };
  });

  protected change(name: string, value: FieldValue): void {
    const { bar, step } = this.store.selected();
    if (step === null) return;
    this.store.edit((design) => editStep(design, bar.id, step.id, { [name]: value }), `${step.id}.${name}`);
  }

  protected changeTemperature(value: number | undefined): void {
    const isMetric = this.units.system() === 'mm';
    this.change(
      'temperatureC',
      value === undefined || isMetric ? value : Math.round(celsiusOf(value) * 10) / 10,
    );
  }
}
