import type { Design } from '@shared/design';
import type { Look, Moment } from '@shared/pattern';
import type { PictureOrder } from '../../core/compute/compute-client';
import type { ShownView } from './views';

/** What a picture is to show, wherever and however large it is drawn. */
export interface PictureSource {
  readonly design: Design;
  readonly at: Moment;
  readonly view: ShownView;
  readonly look: Look;
  readonly isGrey: boolean;
}

/** Samples at the borders of layers on the screen and in files. */
export const SAMPLES = 16;

/** The part of an order that its source tells. */
export function orderOf({
  design,
  at,
  view,
  look,
  isGrey,
}: PictureSource): Pick<PictureOrder, 'design' | 'at' | 'surface' | 'look' | 'isGrey'> {
  return { design, at, surface: view.surface, look, isGrey };
}

/** Whether two pictures show the same place of the same bar, in whatever look. */
export function isSameSubject(a: PictureSource, b: PictureSource): boolean {
  return (
    a.design === b.design &&
    a.at.bar === b.at.bar &&
    a.at.state === b.at.state &&
    JSON.stringify(a.view.surface) === JSON.stringify(b.view.surface)
  );
}
