import { ComponentHarness } from '@angular/cdk/testing';

/** Reads a `lw-steel-swatch`. */
export class SteelSwatchHarness extends ComponentHarness {
  static readonly hostSelector = 'lw-steel-swatch';

  /** Its colour as the browser computes it. */
  async getColour(): Promise<string> {
    return (await this.host()).getCssValue('background-color');
  }

  async isHatched(): Promise<boolean> {
    return (await (await this.host()).getCssValue('background-image')) !== 'none';
  }
}
