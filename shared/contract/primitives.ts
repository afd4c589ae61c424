import * as z from 'zod';

export const idSchema = z.uuid();
/** Row version of an editable thing; sent back quoted as `If-Match`. */
export const versionSchema = z.int().min(1);
export const roles = ['technician', 'engineer', 'supervisor', 'administrator'] as const;
export const roleSchema = z.enum(roles);
export type Role = z.infer<typeof roleSchema>;
export const emailSchema = z.email().max(200);
/** 12 to 128 characters, never truncated (security.md). */
export const passwordSchema = z.string().min(12).max(128);
