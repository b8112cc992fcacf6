import type { Format } from '@shared/units';
import type { ShownView } from './views';

/** What is shown, in a sentence: "Top face ground 2 mm deep, 281 × 45 mm". */
export function viewText({ label, place, widthMm, heightMm }: ShownView, format: Format): string {
  const where =
    place === null
      ? ''
      : place.kind === 'depth'
        ? place.mm < 0.005
          ? ', not ground'
          : ` ground ${format.length(place.mm)} deep`
        : `, ${format.length(place.mm)} from the ${label === 'Cross-section' ? 'near end' : 'left side'}`;
  return `${label}${where}, ${format.size([widthMm, heightMm])}`;
}

/** What the picture shows of which bar, for whoever can't see it. */
export interface PictureFacts {
  readonly view: ShownView;
  /** "after Draw out", "as it is put together". */
  readonly moment: string;
  readonly bar: string;
  readonly layers: number;
  /** Names, brightest first, with their tones. */
  readonly steels: readonly { readonly name: string; readonly tone: string }[];
}

/** "Top face ground 2 mm deep, 281 × 45 mm: Billet after Draw out, 45 layers of 15N20 (bright) and 1084 (dark)." */
export function pictureText({ view, moment, bar, layers, steels }: PictureFacts, format: Format): string {
  const names = listed(steels.map(({ name, tone }) => `${name} (${tone})`));
  const count = layers === 1 ? '1 layer' : `${format.count(layers)} layers`;
  return `${viewText(view, format)}: ${bar} ${moment}, ${count} of ${names}.`;
}

function listed(parts: readonly string[]): string {
  if (parts.length < 2) return parts.join('');
  return `${parts.slice(0, -1).join(', ')} and ${parts[parts.length - 1] ?? ''}`;
}
