import { ComponentHarness, type HarnessLoader, type TestElement, type TestKey } from '@angular/cdk/testing';
import { MatMenuHarness } from '@angular/material/menu/testing';

/** Drives a `lw-journey` as its users do: by its tiles, its seams, its buttons and by keys. */
export class JourneyHarness extends ComponentHarness {
  static readonly hostSelector = 'lw-journey';

  private readonly tiles = this.locatorForAll('.tile');
  private readonly seams = this.locatorForAll('.seam');
  private readonly headings = this.locatorForAll('h3');

  /** What each tile says at its top, bar after bar. */
  async getNames(): Promise<string[]> {
    return this.texts('.tile .name');
  }

  /** What each computed tile says of size. */
  async getSizes(): Promise<string[]> {
    return this.texts('.tile .size');
  }

  /** What stands in tiles without a picture: why a step can't be done, and that what follows isn't computed. */
  async getReasons(): Promise<string[]> {
    return this.texts('.tile .none');
  }

  /** What each computed tile says of layers and mass. */
  async getContents(): Promise<string[]> {
    return this.texts('.tile .content');
  }

  async getBars(): Promise<string[]> {
    return Promise.all((await this.headings()).map((heading) => heading.text()));
  }

  /** Index of the tile that is selected, over all bars. */
  async getSelected(): Promise<number> {
    const marks = await Promise.all((await this.tiles()).map((tile) => tile.getAttribute('aria-current')));
    return marks.indexOf('step');
  }

  async select(index: number): Promise<void> {
    await (await this.tile(index)).click();
  }

  async press(index: number, key: TestKey, isAlt = false): Promise<void> {
    const tile = await this.tile(index);
    await tile.focus();
    await tile.sendKeys({ alt: isAlt }, key);
  }

  async isFocused(index: number): Promise<boolean> {
    return (await this.tile(index)).isFocused();
  }

  /** Adds a step by the seam behind a tile. */
  async insertBehind(index: number, kind: RegExp): Promise<void> {
    await (await this.seams())[index]?.click();
    await this.chooseFromMenu(kind);
  }

  /** Presses one of the buttons above the strips. */
  async pressButton(label: string): Promise<void> {
    await (await this.locatorFor(`button[aria-label="${label}"]`)()).click();
  }

  async isButtonDisabled(label: string): Promise<boolean> {
    return (await this.locatorFor(`button[aria-label="${label}"]`)()).getProperty<boolean>('disabled');
  }

  async chooseFromMenu(text: RegExp): Promise<void> {
    const root: HarnessLoader = await this.documentRootLocatorFactory().rootHarnessLoader();
    const menus = await root.getAllHarnesses(MatMenuHarness);
    for (const menu of menus) {
      if (await menu.isOpen()) return menu.clickItem({ text });
    }
    throw new Error('No menu is open');
  }

  private async tile(index: number): Promise<TestElement> {
    const tile = (await this.tiles())[index];
    if (!tile) throw new RangeError(`The journey has no tile ${index}`);
    return tile;
  }

  private async texts(selector: string): Promise<string[]> {
    return Promise.all((await this.locatorForAll(selector)()).map((element) => element.text()));
  }
}
