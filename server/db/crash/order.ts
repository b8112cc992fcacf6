import { z } from 'zod';
import { FAULTY_CALLS } from '../../testing/faulty-file-system.js';

/** What the killed process is told to do, as one line of JSON. */
export const orderSchema = z.strictObject({
  kind: z.enum(['queue', 'driver']),
  /** The data folder, or for the driver the database file. */
  folder: z.string(),
  /** Part of every identifier that this run writes. */
  run: z.string(),
  /** The call of the file system at which the process ends itself; killed from outside when absent. */
  dieAt: z.strictObject({ call: z.enum(FAULTY_CALLS), nth: z.number().int() }).optional(),
});

export type Order = z.infer<typeof orderSchema>;
