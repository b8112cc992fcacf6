import {
  ChangeDetectionStrategy,
  Component,
  TemplateRef,
  computed,
  contentChild,
  inject,
} from '@angular/core';
import type { Design } from '@shared/design';
import { kindOf } from '@shared/steps';
import { DesignStore } from '../design-store';
import { PatternView } from './pattern-view';

/**
 * The surface of the bar that is selected in the journey, as it is after the selected step or the last one that can be
 * done. Its content (`<ng-template>`) is the drawing that can be seen instead.
 */
@Component({
  selector: 'lw-state-surface',
  imports: [PatternView],
  template: `
    @if (shown(); as state) {
      <lw-pattern-view
        [design]="store.design()"
        [at]="at()"
        [bar]="state.bar"
        [moment]="moment()"
        [isResult]="isResult()"
        [drawing]="drawing() ?? null"
        (unevennessChange)="setUnevenness($event)"
        (unevennessEnd)="store.closeRun()"
      />
    }
  `,
  styles: `
    :host {
      display: flex;
      flex: 1;
      min-height: 0;
    }

    lw-pattern-view {
      flex: 1;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StateSurface {
  protected readonly store = inject(DesignStore);
  protected readonly drawing = contentChild<TemplateRef<unknown>>(TemplateRef);

  protected readonly at = computed(
    () => {
      const { bar, forged, place } = this.store.selected();
      return { bar: bar.id, state: Math.min(place, forged.states.length - 1) };
    },
    { equal: (a, b) => a.bar === b.bar && a.state === b.state },
  );
  protected readonly shown = computed(() => this.store.selected().forged.states[this.at().state] ?? null);
  /** The blade is ground from the result as it is in the end. */
  protected readonly isResult = computed(() => {
    const { bar, forged } = this.store.selected();
    const { result } = this.store.design();
    return bar.id === result && forged.refusal === null && this.at().state === forged.states.length - 1;
  });
  protected readonly moment = computed(() => {
    const step = this.shown()?.step;
    return step ? `after ${kindOf(step).words.name}` : 'as it is put together';
  });

  protected setUnevenness(unevenness: number): void {
    this.store.edit((design) => withUnevenness(design, unevenness), 'unevenness');
  }
}

/** None at all is not written down. */
function withUnevenness(design: Design, unevenness: number): Design {
  if ((design.unevenness ?? 0) === unevenness) return design;
  const { unevenness: _, ...rest } = design;
  return unevenness === 0 ? rest : { ...rest, unevenness };
}
