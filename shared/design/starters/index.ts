import type { Design } from '../schema.js';
import { straight } from './straight.js';

/** A ready design to start from. */
export interface Starter {
  readonly id: string;
  readonly title: string;
  readonly sentence: string;
  readonly design: Design;
}

export const STARTERS: readonly Starter[] = [straight];
