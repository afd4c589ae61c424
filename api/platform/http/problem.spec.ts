import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { hasSentence } from '@shared/contract';
import { Refusal, type RefusalCode } from '../refusal';
import { fieldsOf, problemOf } from './problem';

const codes: RefusalCode[] = [
  ...(['not_found', 'not_signed_in', 'not_allowed', 'wrong_credentials', 'cross_site'] as const),
  ...(['too_many_attempts', 'busy', 'unavailable', 'invalid_request', 'malformed_json'] as const),
  ...(['unsupported_media_type', 'body_too_large', 'version_missing', 'internal'] as const),
  ...(['version_conflict', 'key_missing', 'key_reused'] as const),
];

describe('A problem', () => {
  it.each(codes)('%s has a status and a sentence', (code) => {
    const problem = problemOf(new Refusal(code));
    expect(hasSentence(code)).toBe(true);
    expect(problem.detail).not.toBe(code);
    expect(problem.status === 500).toBe(code === 'internal');
  });

  it('names each field with a code that has a sentence', () => {
    const schema = z.object({
      name: z.string().min(3),
      age: z.int().max(9).multipleOf(2),
      role: z.enum(['a', 'b']),
      email: z.email(),
      list: z.array(z.object({ id: z.uuid() })),
    });
    const wrong = { name: 'x', age: 11, role: 'c', email: 'd', list: [{ id: 'e' }] };
    const fields = fieldsOf(schema.safeParse(wrong).error!);
    expect(new Set(fields.map(({ field }) => field))).toEqual(
      new Set(['name', 'age', 'role', 'email', 'list.0.id']),
    );
    expect(fields.filter(({ code }) => !hasSentence(code))).toEqual([]);
  });
});
