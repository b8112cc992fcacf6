/** A new id for a bar or a step: 12 signs of a to z and 0 to 9, unique for all that a design can hold. */
export function newId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(12));
  return Array.from(bytes, (byte) => (byte % 36).toString(36)).join('');
}
