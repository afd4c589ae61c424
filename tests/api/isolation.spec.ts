import { randomUUID } from 'node:crypto';
import { sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { asOwner, openDatabase, type Database } from '../../api/platform/db/doors';
import { organisation, site } from '../../api/platform/db/schema';
import { freshDatabase, type FreshDatabase } from './freshDatabase';

const [ours, theirs, person] = [randomUUID(), randomUUID(), randomUUID()];
let fresh: FreshDatabase;
let database: Database;

beforeAll(async () => {
  fresh = await freshDatabase();
  database = openDatabase(fresh.applicationUrl);
  await asOwner(fresh.ownerUrl, async ({ db }) => {
    for (const organisationId of [ours, theirs]) {
      await db
        .insert(organisation)
        .values({ organisationId, name: 'A', timeZone: 'Europe/Berlin' });
      await db
        .insert(site)
        .values({ organisationId, id: randomUUID(), name: 'S', address: 'Street' });
    }
  });
});
afterAll(async () => {
  await database.close();
  await fresh.drop();
});

describe('The door of an organisation', () => {
  it('shows its own rows only, without any predicate', async () => {
    const rows = await database.inOrganisation(ours, person, ({ db }) => db.select().from(site));
    expect(rows.map((row) => row.organisationId)).toEqual([ours]);
  });

  it('changes nothing of another organisation', async () => {
    await database.inOrganisation(ours, person, ({ db }) => db.update(site).set({ name: 'Taken' }));
    const names = await asOwner(fresh.ownerUrl, ({ db }) => db.select().from(site));
    expect(names.filter((row) => row.name === 'Taken').map((row) => row.organisationId)).toEqual([
      ours,
    ]);
  });

  it('takes no row that names another organisation', async () => {
    const attempt = database.inOrganisation(ours, person, ({ db }) =>
      db.insert(site).values({ organisationId: theirs, id: randomUUID(), name: 'x', address: 'y' }),
    );
    await expect(attempt).rejects.toMatchObject({ cause: { code: '42501' } });
  });

  it('leaves nothing open behind it: the connection then sees no row', async () => {
    const one = openDatabase(fresh.applicationUrl);
    await one.inOrganisation(ours, person, ({ db }) => db.select().from(site));
    const seen = await one.beforeSignIn(({ db }) => db.execute(sql`select * from site`));
    expect(seen.rows).toEqual([]);
    await one.close();
  });

  it('has no way to change the log, the audit or an issued revision', async () => {
    for (const table of ['case_event', 'audit', 'circuit_revision', 'quarantine']) {
      for (const statement of [`delete from ${table}`, `truncate ${table}`]) {
        const attempt = database.inOrganisation(ours, person, ({ db }) =>
          db.execute(sql.raw(statement)),
        );
        await expect(attempt, statement).rejects.toMatchObject({ cause: { code: '42501' } });
      }
    }
  });
});
