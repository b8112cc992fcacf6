/** Who is signed in, as every request knows it. */
export interface SignedInAccount {
  readonly id: string;
  readonly name: string;
  readonly email: string;
}

declare global {
  // Express and Passport agree on this place for it.
  // eslint-disable-next-line @typescript-eslint/no-namespace
  namespace Express {
    // eslint-disable-next-line @typescript-eslint/no-empty-object-type
    interface User extends SignedInAccount {}
  }
}
