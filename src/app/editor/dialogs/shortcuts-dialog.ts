import { ChangeDetectionStrategy, Component, DOCUMENT, inject } from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MatDialogModule } from '@angular/material/dialog';
import { shortcutGroups } from './shortcuts';

/** What the keys do. */
@Component({
  selector: 'lw-shortcuts-dialog',
  imports: [MatButtonModule, MatDialogModule],
  templateUrl: './shortcuts-dialog.html',
  styleUrl: './shortcuts-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ShortcutsDialog {
  protected readonly groups = shortcutGroups(
    /Mac|iPhone|iPad/.test(inject(DOCUMENT).defaultView?.navigator.userAgent ?? ''),
  );
}
