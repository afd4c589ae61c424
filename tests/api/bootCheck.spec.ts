import { sql } from 'drizzle-orm';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { checkDatabase } from '../../api/platform/db/bootCheck';
import { asOwner } from '../../api/platform/db/doors';
import { freshDatabase, type FreshDatabase } from './freshDatabase';

let fresh: FreshDatabase;
beforeEach(async () => void (fresh = await freshDatabase()));
afterEach(() => fresh.drop());

const owner = (statement: string) =>
  asOwner(fresh.ownerUrl, ({ db }) => db.execute(sql.raw(statement)));
const codes = async () =>
  (await checkDatabase(fresh.applicationUrl)).map(({ code, what }) => `${code}: ${what}`);

describe('The check at the start', () => {
  it('finds nothing in a migrated database', async () => {
    expect(await codes()).toEqual([]);
  });

  it('finds a planted table that forgot its walls', async () => {
    await owner('create table planted (organisation_id uuid, id uuid, primary key (id))');
    expect(await codes()).toEqual([
      'no row security: planted',
      'row security not forced: planted',
      'no policy: planted',
      'key does not start with organisation: planted_pkey',
    ]);
  });

  it('finds a table of no organisation', async () => {
    await owner('create table planted (id int)');
    expect(await codes()).toEqual(['table without organisation: planted']);
  });

  it.each([
    ['alter table lift no force row level security', 'row security not forced: lift'],
    ['alter table lift disable row level security', 'no row security: lift'],
    ['alter table lift owner to lampline_app', 'application owns table: lift'],
    ['grant delete on case_event to lampline_app', 'log can be changed: case_event'],
    ['grant update (hash) on audit to lampline_app', 'log can be changed: audit'],
    ['grant select on throttle to lampline_app', 'table without organisation: throttle'],
  ])('%s', async (statement, finding) => {
    await owner(statement);
    expect(await codes()).toEqual([finding]);
  });

  it('refuses commits that are not waited for', async () => {
    const name = new URL(fresh.ownerUrl).pathname.slice(1);
    await owner(`alter database ${name} set synchronous_commit = off`);
    expect(await codes()).toEqual(['setting too weak: synchronous_commit = off']);
  });
});
