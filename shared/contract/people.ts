import * as z from 'zod';
import { emailSchema, idSchema, roleSchema, versionSchema } from './primitives';

export const personSchema = z.object({
  id: idSchema,
  name: z.string(),
  email: emailSchema,
  role: roleSchema,
  disabled: z.boolean(),
  version: versionSchema,
});
export type Person = z.infer<typeof personSchema>;

/** Role and disabling are the administrator's; name the person's own. */
export const personChangeSchema = z
  .object({ name: z.string().trim().min(1).max(120), role: roleSchema, disabled: z.boolean() })
  .partial();
export type PersonChange = z.infer<typeof personChangeSchema>;
