import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatIconModule } from '@angular/material/icon';
import { WARNING_SEVERITIES, type Warning, type WarningSeverity, refusalWords } from '@shared/checks';
import { kindOf } from '@shared/steps';
import type { QuantityParts } from '@shared/units';
import { UnitsStore } from '../../core/units/units-store';
import { Figure } from '../../ui/figure/figure';
import { WarningList } from '../../ui/warning-list/warning-list';
import { DesignStore } from '../design-store';

const SEVERITY_WORDS: Readonly<Record<WarningSeverity, readonly [one: string, many: string]>> = {
  stop: ['stop', 'stops'],
  caution: ['caution', 'cautions'],
  note: ['note', 'notes'],
};

/** The line under the journey: what goes in, what comes out, what it takes, and all warnings. */
@Component({
  selector: 'lw-totals-line',
  imports: [Figure, MatIconModule, WarningList],
  templateUrl: './totals-line.html',
  styleUrl: './totals-line.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TotalsLine {
  protected readonly store = inject(DesignStore);
  private readonly units = inject(UnitsStore);

  protected readonly figures = computed((): readonly { label: string; parts: QuantityParts }[] | null => {
    const { totals, result } = this.store.forging();
    if (!totals || !result) return null;
    const format = this.units.format();
    const count = (value: number): QuantityParts => ({ number: format.count(value), unit: '' });
    return [
      { label: 'Start', parts: format.massParts(totals.startMassKg) },
      { label: 'End', parts: format.massParts(totals.endMassKg) },
      { label: 'Yield', parts: { number: format.number(totals.yieldPercent, { digits: 0 }), unit: '%' } },
      { label: 'Welds', parts: count(totals.welds) },
      { label: 'Heats', parts: count(totals.heats) },
      { label: 'Layers', parts: count(result.bar.layers) },
    ];
  });

  /** Why there is no result. */
  protected readonly refusal = computed(() => {
    const { bars } = this.store.forging();
    const refused = bars.find((bar) => bar.endsInResult && bar.refusal !== null);
    if (!refused?.refusal) return null;
    return {
      barId: refused.id,
      stepId: refused.refusal.step?.id ?? null,
      words: refusalWords(refused.refusal, this.store.design(), this.units.format()),
    };
  });

  protected readonly counts = computed(() =>
    WARNING_SEVERITIES.flatMap((severity) => {
      const { length } = this.store.warnings().filter((warning) => warning.severity === severity);
      const [one, many] = SEVERITY_WORDS[severity];
      return length === 0 ? [] : [{ severity, words: `${length} ${length === 1 ? one : many}` }];
    }),
  );

  protected readonly placeWords = (warning: Warning): string => {
    const bar = this.store.design().bars.find((candidate) => candidate.id === warning.bar);
    const at = bar?.steps.findIndex((step) => step.id === warning.stepId) ?? -1;
    const step = bar?.steps[at];
    const place = step ? `step ${at + 1}, ${kindOf(step).words.name}` : 'start';
    return this.store.design().bars.length === 1 ? `Go to ${place}` : `Go to ${bar?.name ?? ''}, ${place}`;
  };

  protected goTo(place: { readonly barId: string; readonly stepId: string | null }): void {
    this.store.select(place.barId, place.stepId);
  }
}
