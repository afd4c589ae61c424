import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { firstBrokenLink } from '../../api/platform/db/audit';
import { asOwner, type Transaction } from '../../api/platform/db/doors';
import {
  audit,
  caseEvent,
  caseRow,
  circuitRevision,
  counter,
  lift,
  organisation,
  personDetails,
  site,
} from '../../api/platform/db/schema';
import { isPassword } from '../../api/platform/password';
import { loadDemo } from '../../seeds/load';
import { freshDatabase, type FreshDatabase } from './freshDatabase';

let database: FreshDatabase;
let accounts: Awaited<ReturnType<typeof loadDemo>>;

beforeAll(async () => {
  database = await freshDatabase();
  accounts = await loadDemo(database.ownerUrl);
});
afterAll(() => database.drop());

const inspect = <T>(work: (db: Transaction) => Promise<T>): Promise<T> =>
  asOwner(database.ownerUrl, ({ db }) => work(db));

const counts = () =>
  inspect(async (db) => ({
    organisations: (await db.select().from(organisation)).length,
    sites: (await db.select().from(site)).length,
    lifts: (await db.select().from(lift)).length,
    revisions: (await db.select().from(circuitRevision)).length,
    cases: (await db.select().from(caseRow)).length,
    events: (await db.select().from(caseEvent)).length,
    audited: (await db.select().from(audit)).length,
  }));

describe('the demo', () => {
  it('is loaded into an empty database, once', async () => {
    const first = await counts();
    expect(first).toMatchObject({ organisations: 2, sites: 4, lifts: 8, revisions: 4, cases: 12 });
    expect(await loadDemo(database.ownerUrl)).toEqual(accounts);
    expect(await counts()).toEqual(first);
  });

  it('has accounts whose passwords fit', async () => {
    const stored = await inspect((db) => db.select().from(personDetails));
    expect(stored).toHaveLength(accounts.length);
    for (const { email, password } of accounts) {
      const hash = stored.find((details) => details.email === email)?.passwordHash;
      expect(await isPassword(password, hash), email).toBe(true);
    }
  });

  it('goes on where its events end: counters, case versions, and whole audit chains', async () => {
    await inspect(async (db) => {
      for (const { organisationId, position } of await db.select().from(counter)) {
        const events = (await db.select().from(caseEvent)).filter(
          (event) => event.organisationId === organisationId,
        );
        expect(events.map((event) => event.position).sort((a, b) => a - b)).toEqual(
          events.map((_, k) => k + 1),
        );
        expect(position).toBe(events.length);
        expect(await firstBrokenLink({ db, organisationId, personId: '' })).toBeUndefined();
        for (const row of await db.select().from(caseRow)) {
          if (row.organisationId !== organisationId) continue;
          const own = events.filter((event) => event.caseId === row.id);
          expect(row.version).toBe(own.length);
          expect(Math.max(...own.map((event) => event.caseVersion))).toBe(own.length);
        }
      }
    });
  });
});
