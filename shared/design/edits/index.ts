import type { Blank } from '../blank.js';
import type { Design } from '../schema.js';

export * from './bars.js';
export * from './layers.js';
export * from './steps.js';

export function renameDesign(design: Design, name: string): Design {
  return design.name === name ? design : { ...design, name };
}

/** Sets the finished piece the billet is for, or takes it away. */
export function setBlank(design: Design, blank: Blank | undefined): Design {
  const { blank: _, ...rest } = design;
  return blank ? { ...rest, blank } : rest;
}
