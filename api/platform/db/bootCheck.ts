import pg from 'pg';

/** What is wrong with a database, as findings; empty when it may serve. */
export interface BootFinding {
  readonly code:
    | 'no row security'
    | 'row security not forced'
    | 'application owns table'
    | 'no policy'
    | 'table without organisation'
    | 'key does not start with organisation'
    | 'role too strong'
    | 'log can be changed'
    | 'setting too weak';
  readonly what: string;
}

/** The only tables without an organisation; neither is granted to the application's role. */
const WITHOUT_ORGANISATION = ['throttle'];
/** The one unique key over all organisations (architecture.md: a person belongs to one). */
const OVER_ALL = ['person_details_email_everywhere'];
const APPEND_ONLY = ['case_event', 'audit', 'quarantine', 'circuit_revision'];

interface TableRow {
  readonly name: string;
  readonly organisation: boolean;
  readonly enabled: boolean;
  readonly forced: boolean;
  readonly ours: boolean;
  readonly policies: number;
  readonly readable: boolean;
}

/**
 * Asks the catalogue, as the application's role, whether the walls stand and what is committed stays.
 * Every table with an organisation is looked at, so that a forgotten one is found at the next start.
 */
export async function checkDatabase(applicationUrl: string): Promise<readonly BootFinding[]> {
  const client = new pg.Client({ connectionString: applicationUrl });
  await client.connect();
  try {
    return [
      ...(await checkTables(client)),
      ...(await checkKeys(client)),
      ...(await checkRole(client)),
      ...(await checkGrants(client)),
      ...(await checkSettings(client)),
    ];
  } finally {
    await client.end();
  }
}

async function checkTables(client: pg.Client): Promise<BootFinding[]> {
  const { rows } = await client.query<TableRow>(`
    select c.relname as name,
           exists (select from pg_attribute a where a.attrelid = c.oid
                   and a.attname = 'organisation_id' and not a.attisdropped) as organisation,
           c.relrowsecurity as enabled,
           c.relforcerowsecurity as forced,
           pg_has_role(current_user, c.relowner, 'member') as ours,
           (select count(*)::int from pg_policy p where p.polrelid = c.oid) as policies,
           has_table_privilege(current_user, c.oid, 'select') as readable
    from pg_class c
    where c.relkind in ('r', 'p') and c.relnamespace = 'public'::regnamespace
    order by c.relname`);
  return rows.flatMap((table) => {
    const codes: BootFinding['code'][] = [];
    if (table.ours) codes.push('application owns table');
    if (!table.organisation) {
      if (table.readable || !WITHOUT_ORGANISATION.includes(table.name)) {
        codes.push('table without organisation');
      }
    } else {
      if (!table.enabled) codes.push('no row security');
      if (!table.forced) codes.push('row security not forced');
      if (table.policies === 0) codes.push('no policy');
    }
    return codes.map((code) => ({ code, what: table.name }));
  });
}

/** Primary and unique keys and foreign keys whose first column is not the organisation. */
async function checkKeys(client: pg.Client): Promise<BootFinding[]> {
  const { rows } = await client.query<{ name: string }>(
    `select i.relname as name
     from pg_index x
     join pg_class i on i.oid = x.indexrelid
     join pg_class t on t.oid = x.indrelid and t.relnamespace = 'public'::regnamespace
     left join pg_attribute a on a.attrelid = t.oid and a.attnum = x.indkey[0]
     where x.indisunique and a.attname is distinct from 'organisation_id'
       and not t.relname = any ($1) and not i.relname = any ($2)
     union all
     select c.conname
     from pg_constraint c
     join pg_class t on t.oid = c.conrelid and t.relnamespace = 'public'::regnamespace
     left join pg_attribute a on a.attrelid = t.oid and a.attnum = c.conkey[1]
     where c.contype = 'f' and a.attname is distinct from 'organisation_id'`,
    [WITHOUT_ORGANISATION, OVER_ALL],
  );
  return rows.map(({ name }) => ({ code: 'key does not start with organisation', what: name }));
}

async function checkRole(client: pg.Client): Promise<BootFinding[]> {
  const { rows } = await client.query<{ name: string; strong: boolean }>(`
    select r.rolname as name, bool_or(m.rolsuper or m.rolbypassrls or m.rolcreaterole) as strong
    from pg_roles r
    join pg_roles m on pg_has_role(r.oid, m.oid, 'member')
    where r.rolname = current_user group by r.rolname`);
  return rows
    .filter(({ strong }) => strong)
    .map(({ name }) => ({ code: 'role too strong', what: name }));
}

async function checkGrants(client: pg.Client): Promise<BootFinding[]> {
  const { rows } = await client.query<{ name: string; change: boolean }>(
    `select c.relname as name,
            has_table_privilege(current_user, c.oid, 'update, delete, truncate')
            or has_any_column_privilege(current_user, c.oid, 'update') as change
     from pg_class c
     where c.relnamespace = 'public'::regnamespace and c.relname = any ($1)`,
    [APPEND_ONLY],
  );
  return rows
    .filter(({ change }) => change)
    .map(({ name }) => ({ code: 'log can be changed', what: name }));
}

/** Weaker than `on` loses acknowledged commits; `remote_write` and `remote_apply` are stronger. */
const STRONG_COMMITS = ['on', 'remote_write', 'remote_apply'];

async function checkSettings(client: pg.Client): Promise<BootFinding[]> {
  const { rows } = await client.query<{ name: string; setting: string }>(
    `select name, setting from pg_settings
     where name in ('fsync', 'full_page_writes', 'synchronous_commit')`,
  );
  return rows
    .filter(({ name, setting }) =>
      name === 'synchronous_commit' ? !STRONG_COMMITS.includes(setting) : setting !== 'on',
    )
    .map(({ name, setting }) => ({ code: 'setting too weak', what: `${name} = ${setting}` }));
}
