import { z } from 'zod';
import { ROLES } from '../db/entities/index.js';
import { MAX_PASSWORD_LENGTH, MIN_PASSWORD_LENGTH } from './password-rules.js';

const email = z
  .string()
  .trim()
  .toLowerCase()
  .max(254)
  .pipe(z.email({ error: 'An e-mail address has the form name@example.org.' }))
  .describe('E-mail address; capitals make no difference');

const name = z
  .string()
  .trim()
  .min(1)
  .max(80)
  .regex(/^[^\p{Cc}]*$/u, 'A name has no control characters.')
  .describe('What the shop calls you');

export const registrationSchema = z.strictObject({
  name,
  email,
  password: z
    .string()
    .min(MIN_PASSWORD_LENGTH, `At least ${MIN_PASSWORD_LENGTH} characters.`)
    .max(MAX_PASSWORD_LENGTH)
    .describe('Any characters; the commonest passwords are refused'),
});

export const credentialsSchema = z.strictObject({
  email,
  // No lower limit: a wrong password is wrong, whatever its length.
  password: z.string().min(1).max(MAX_PASSWORD_LENGTH),
});

export const signedInSchema = z.strictObject({
  account: z.strictObject({ id: z.string(), name: z.string(), email: z.string() }),
  shops: z
    .array(z.strictObject({ id: z.string(), name: z.string(), role: z.enum(ROLES) }))
    .describe('The shops that the account belongs to, and as what'),
});

export const sessionSchema = z.strictObject({
  signedIn: signedInSchema.nullable().describe('Null when nobody is signed in'),
});

export const tokenSchema = z.strictObject({ token: z.string() });
