import * as z from 'zod';
import { emailSchema, idSchema, roleSchema } from './primitives';

export const signInSchema = z.object({ email: emailSchema, password: z.string().min(1).max(128) });
export type SignIn = z.infer<typeof signInSchema>;

/** Who is signed in, as the device keeps it. */
export const sessionSchema = z.object({
  person: z.object({ id: idSchema, name: z.string(), role: roleSchema }),
  organisation: z.object({ id: idSchema, name: z.string(), timeZone: z.string() }),
  /** When the access token ends, ISO 8601; refreshed before. */
  until: z.iso.datetime(),
});
export type Session = z.infer<typeof sessionSchema>;
