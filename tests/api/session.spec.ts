import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { GRACE } from '../../api/features/session/refreshSession';
import { firstBrokenLink } from '../../api/platform/db/audit';
import { audit, person, refreshToken, session } from '../../api/platform/db/schema';
import { problemSchema, sessionSchema } from '../../shared/contract';
import { PASSWORD } from './fixtures';
import { startTestServer, type TestServer } from './server';

let server: TestServer;
beforeAll(async () => void (server = await startTestServer()));
afterAll(() => server.stop());

/** `Cookie` header made of the answer's Set-Cookie lines. */
function cookiesOf(answer: { headers: Record<string, unknown> }): string {
  const lines = (answer.headers['set-cookie'] ?? []) as string[];
  return lines.map((line) => line.split(';', 1)[0]).join('; ');
}

const signIn = (email: string, password = PASSWORD, cookie = '') =>
  server.withCookies(cookie).post('/api/session', { email, password });

describe('POST /api/session', () => {
  it('signs in, hands out the three cookies, and stores a session and an audit link', async () => {
    const { ours } = server.fixtures;
    const answer = await signIn('Technician@Ours.example').expect(200);
    const body = sessionSchema.parse(answer.body);
    expect(body.person.id).toBe(ours.technician.personId);
    const lines = answer.headers['set-cookie'] as unknown as string[];
    expect(lines).toHaveLength(3);
    for (const line of lines) {
      expect(line).toMatch(/; HttpOnly; Secure; SameSite=Strict$/);
      expect(line).toMatch(/^__Host-.*; Path=\/;|^__Secure-.*; Path=\/api\/session;/);
    }
    await server.withCookies(cookiesOf(answer)).get('/api/session').expect(200);
    const stored = await server.asOwner(({ db }) => db.select().from(audit));
    expect(stored.at(-1)).toMatchObject({ action: 'sign in', actor: ours.technician.personId });
    const { organisationId, personId } = ours.technician;
    const broken = await server.database.inOrganisation(organisationId, personId, firstBrokenLink);
    expect(broken).toBeUndefined();
  });

  it('answers an unknown, a mistyped and a disabled account alike', async () => {
    const { engineer } = server.fixtures.theirs;
    await server.asOwner(({ db }) =>
      db.update(person).set({ disabled: true }).where(eq(person.id, engineer.personId)),
    );
    const answers = await Promise.all([
      signIn('nobody@ours.example').expect(401),
      signIn('technician@theirs.example', 'another password').expect(401),
      signIn(engineer.email).expect(401),
    ]);
    const [first, ...others] = answers.map(({ body }) => {
      const { requestId: _, ...rest } = problemSchema.parse(body);
      return rest;
    });
    expect(first?.code).toBe('wrong_credentials');
    for (const other of others) expect(other).toEqual(first);
  });

  it('names the field of a bad request', async () => {
    const answer = await signIn('no address').expect(400);
    expect(problemSchema.parse(answer.body)).toMatchObject({
      code: 'invalid_request',
      fields: [{ field: 'email', code: 'field.invalid_format' }],
    });
  });

  it('stops guesses with Retry-After, but lets the known device in', async () => {
    const email = 'supervisor@ours.example';
    const known = cookiesOf(await signIn(email).expect(200));
    let refused: { status: number; headers: Record<string, string> } | undefined;
    for (let guess = 0; guess < 12 && !refused; guess++) {
      const answer = await signIn(email, `guess number ${guess}`);
      if (answer.status === 429) refused = answer;
    }
    expect(refused?.status).toBe(429);
    expect(Number(refused?.headers['retry-after'])).toBeGreaterThan(0);
    await signIn(email).expect(429);
    await signIn(email, PASSWORD, known).expect(200);
  });
});

describe('POST /api/session/refresh', () => {
  const refresh = (cookie: string) => server.withCookies(cookie).post('/api/session/refresh');

  it('rotates, and gives a second tab the same successor', async () => {
    const first = cookiesOf(await signIn('administrator@ours.example').expect(200));
    const [one, two] = await Promise.all([refresh(first).expect(200), refresh(first).expect(200)]);
    const token = (cookie: string) => /__Secure-lampline-refresh=([^;]+)/.exec(cookie)?.[1];
    expect(token(cookiesOf(one))).toBe(token(cookiesOf(two)));
    expect(token(cookiesOf(one))).not.toBe(token(first));
  });

  it('serves fifty tabs at once and signs none of them out', async () => {
    const first = cookiesOf(await signIn('administrator@ours.example').expect(200));
    const answers = await Promise.all(Array.from({ length: 50 }, () => refresh(first)));
    expect(new Set(answers.map(({ status }) => status))).toEqual(new Set([200]));
    const successors = new Set(
      answers.map((answer) => /refresh=([^;]+)/.exec(cookiesOf(answer))?.[1]),
    );
    expect(successors.size).toBe(1);
  });

  it('stores digests only', async () => {
    const cookie = cookiesOf(await signIn('administrator@ours.example').expect(200));
    const token = /__Secure-lampline-refresh=([^;]+)/.exec(cookie)?.[1] ?? '';
    const rows = await server.asOwner(({ db }) => db.select().from(refreshToken));
    const text = JSON.stringify(rows.map(({ digest }) => digest.toString('base64url')));
    expect(token).toHaveLength(43);
    expect(text).not.toContain(token);
  });

  it('ends the family when a used token comes after the grace', async () => {
    const first = cookiesOf(await signIn('administrator@ours.example').expect(200));
    const second = cookiesOf(await refresh(first).expect(200));
    server.advance(GRACE + 1000);
    await refresh(first).expect(401);
    await refresh(second).expect(401);
    await server.withCookies(second).get('/api/session').expect(401);
    const ended = await server.asOwner(({ db }) =>
      db.select().from(session).where(eq(session.endedBecause, 'reuse')),
    );
    expect(ended).toHaveLength(1);
  });

  it('refuses without a cookie and with a made-up token', async () => {
    await refresh('').expect(401);
    await refresh(`__Secure-lampline-refresh=${'A'.repeat(43)}`).expect(401);
  });
});

describe('An access token', () => {
  it('stops working within 10 s when the person is disabled', async () => {
    const visitor = server.as('administrator', 'theirs');
    await visitor.get('/api/session').expect(200);
    const { personId } = server.fixtures.theirs.administrator;
    await server.asOwner(({ db }) =>
      db.update(person).set({ disabled: true }).where(eq(person.id, personId)),
    );
    server.advance(10_000);
    await visitor.get('/api/session').expect(401);
  });
});

describe('DELETE /api/session', () => {
  it('ends the session at once and clears the cookies', async () => {
    const cookie = cookiesOf(await signIn('administrator@ours.example').expect(200));
    const visitor = server.withCookies(cookie);
    await visitor.get('/api/session').expect(200);
    const answer = await visitor.delete('/api/session').expect(204);
    expect(cookiesOf(answer)).toBe('__Host-lampline-access=; __Secure-lampline-refresh=');
    await visitor.get('/api/session').expect(401);
    await visitor.post('/api/session/refresh').expect(401);
  });
});
