import type { Role } from '../db/entities/index.js';

/** The invented shop of the demonstration. */
export const DEMO_SHOP = 'Two Rivers Forge';

export interface DemoPerson {
  readonly role: Role;
  readonly name: string;
  readonly email: string;
  /** No secret: it is in the README, and the shop is in a new database only. */
  readonly password: string;
}

export const DEMO_PEOPLE: readonly DemoPerson[] = [
  { role: 'owner', name: 'Olive Hartwell', email: 'owner@two-rivers.example', password: 'ember-and-anvil' },
  { role: 'smith', name: 'Sam Brandreth', email: 'smith@two-rivers.example', password: 'borax-and-flux' },
  {
    role: 'student',
    name: 'Stella Quarrier',
    email: 'student@two-rivers.example',
    password: 'first-heat-first',
  },
];
