import { describe, expect, it } from 'vitest';
import { readConfig } from './config';

const complete = {
  DATABASE_URL: 'postgres://lampline_app:x@127.0.0.1:5432/lampline',
  SESSION_SECRET: Buffer.alloc(32, 1).toString('base64url'),
  CLIENT_FOLDER: '/srv/client',
};

describe('The configuration', () => {
  it('is read from the environment, with defaults', () => {
    expect(readConfig(complete)).toMatchObject({ port: 4300, logLevel: 'info' });
    expect(readConfig({ ...complete, PORT: '8080' }).port).toBe(8080);
  });

  it.each([
    ['PORT', 'eighty'],
    ['PORT', '70000'],
    ['DATABASE_URL', undefined],
    ['DATABASE_URL', 'mysql://x'],
    ['SESSION_SECRET', undefined],
    ['SESSION_SECRET', Buffer.alloc(31, 1).toString('base64url')],
    ['SESSION_SECRET', 'not base64url !'],
    ['CLIENT_FOLDER', ''],
    ['LOG_LEVEL', 'loud'],
  ])('with %s = %s stops with one sentence that names it', (name, value) => {
    expect(() => readConfig({ ...complete, [name]: value })).toThrow(
      new RegExp(`^The configuration .*${name}.*\\.$`),
    );
  });

  it('never repeats a value: it may be a secret', () => {
    const attempt = () => readConfig({ ...complete, SESSION_SECRET: 'short-secret' });
    expect(attempt).not.toThrow(/short-secret/);
    expect(attempt).toThrow();
  });
});
