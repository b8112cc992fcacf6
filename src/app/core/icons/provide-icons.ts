import {
  type EnvironmentProviders,
  inject,
  makeEnvironmentProviders,
  provideEnvironmentInitializer,
} from '@angular/core';
import { MatIconRegistry } from '@angular/material/icon';
import { DomSanitizer } from '@angular/platform-browser';

/**
 * Makes icons known to `<mat-icon svgIcon="name">`. Given in a feature's routes, its icons load with the feature.
 * @param icons name → SVG text, imported from `@material-symbols/svg-400/outlined/*.svg` (Apache-2.0)
 */
export function provideIcons(icons: Readonly<Record<string, string>>): EnvironmentProviders {
  return makeEnvironmentProviders([
    provideEnvironmentInitializer(() => {
      const registry = inject(MatIconRegistry);
      const sanitizer = inject(DomSanitizer);
      for (const [name, svg] of Object.entries(icons)) {
        // Shipped with the application, never of a reader's making.
        registry.addSvgIconLiteral(name, sanitizer.bypassSecurityTrustHtml(svg));
      }
    }),
  ]);
}
