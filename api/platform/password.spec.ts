import argon2 from 'argon2';
import { describe, expect, it } from 'vitest';
import { hashPassword, isOutdated, isPassword } from './password';

describe('A password', () => {
  it('is hashed with argon2id at the strength of the rule', async () => {
    const hash = await hashPassword('correct horse battery');
    expect(hash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    expect(await isPassword('correct horse battery', hash)).toBe(true);
    expect(await isPassword('correct horse batterY', hash)).toBe(false);
    expect(isOutdated(hash)).toBe(false);
  });

  it('of nobody never fits, not even the one of the dummy', async () => {
    expect(await isPassword('nobody signs in with this one', undefined)).toBe(false);
  });

  it('made with less is outdated', async () => {
    const weak = await argon2.hash('x', { memoryCost: 8192, timeCost: 2, parallelism: 1 });
    expect(isOutdated(weak)).toBe(true);
  });

  it('is refused as busy when too many wait, and all others are answered', async () => {
    const hash = await hashPassword('correct horse battery');
    const asked = Array.from({ length: 60 }, () => isPassword('wrong', hash));
    const settled = await Promise.allSettled(asked);
    const busy = settled.filter(({ status }) => status === 'rejected');
    expect(busy.length).toBeGreaterThan(0);
    expect(busy.length).toBeLessThan(settled.length / 2);
    for (const one of busy) expect(one).toMatchObject({ reason: { code: 'busy' } });
  });
});
