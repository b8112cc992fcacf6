import { ChangeDetectionStrategy, Component } from '@angular/core';
import { Shell } from './core/shell/shell';

@Component({
  selector: 'lw-root',
  imports: [Shell],
  template: '<lw-shell />',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class App {}
