import * as z from 'zod';

/** RFC 9457 problem details. `code` is ours: the key of the sentence. `type` stays `about:blank`. */
export const problemSchema = z.object({
  type: z.literal('about:blank'),
  title: z.string(),
  status: z.int(),
  code: z.string(),
  detail: z.string(),
  details: z.record(z.string(), z.unknown()).optional(),
  /** Beside the field: `field` is a path as `email` or `events.0.type`. */
  fields: z.array(z.object({ field: z.string(), code: z.string(), detail: z.string() })).optional(),
  requestId: z.string(),
});
export type Problem = z.infer<typeof problemSchema>;
