import { ComponentHarness } from '@angular/cdk/testing';

/** Reads a `lw-warning-list`. */
export class WarningListHarness extends ComponentHarness {
  static readonly hostSelector = 'lw-warning-list';

  private readonly messages = this.locatorForAll('.message');
  private readonly places = this.locatorForAll('button');
  private readonly sources = this.locatorForAll('details p');

  /** "Caution. The welding range is only 70 °C wide …" for each. */
  async getMessages(): Promise<string[]> {
    return Promise.all(
      (await this.messages()).map(async (message) => (await message.text()).replace(/\s+/g, ' ')),
    );
  }

  async getSources(): Promise<string[]> {
    return Promise.all((await this.sources()).map((source) => source.getProperty<string>('textContent')));
  }

  async getPlaces(): Promise<string[]> {
    return Promise.all((await this.places()).map((place) => place.text()));
  }

  async openPlace(index: number): Promise<void> {
    await (await this.places())[index]?.click();
  }
}
