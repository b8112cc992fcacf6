import { ChangeDetectionStrategy, Component } from '@angular/core';

@Component({
  selector: 'lw-bench-page',
  template: '<h1>Bench</h1>',
  host: { class: 'lw-page' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BenchPage {}
