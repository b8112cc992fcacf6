import { Foundation1760000000000 } from './1760000000000-foundation.js';

/** Every migration, oldest first. Add a class here and nowhere else; one that was released is never changed. */
export const MIGRATIONS = [Foundation1760000000000];
