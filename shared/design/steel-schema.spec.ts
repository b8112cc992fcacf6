import { CATALOGUE } from '../steels/index.js';
import { steelSchema } from './steel-schema.js';

describe('steelSchema', () => {
  it('takes every material of the catalogue as it is', () => {
    for (const steel of CATALOGUE) {
      const read = steelSchema.safeParse(JSON.parse(JSON.stringify(steel)));
      expect(read.success).withContext(steel.id).toBeTrue();
      if (read.success) expect(read.data).toEqual(steel);
    }
  });
});
