import { v7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { roles, routes, type Role, type Route, type RouteName } from '../../shared/contract';
import { storeField, TestPhone, type Field } from '../api/field';
import { startTestServer, type TestServer, type Visitor } from '../api/server';

/*
 * S1: role × route × ownership. The routes are read from the router at run time; every one needs a row
 * here, and every row a route. `own` are parameters and body of a thing of the own organisation, `foreign`
 * the same of the other one: it must answer as if it were not there.
 */
interface Row {
  /** Who is let in; the router's own word is compared with it. */
  readonly may: readonly Role[] | 'open';
  readonly path?: (thing: Things) => string;
  readonly body?: (thing: Things) => object;
  readonly ifMatch?: number;
  /** Status for those who may, on an own thing. */
  readonly ok: number;
  /** Status for those who may, on a thing of the other organisation; absent where nothing is named. */
  readonly foreign?: number;
  /** Not by role alone: what each role gets on an own thing. */
  readonly byRole?: Partial<Record<Role, number>>;
}

interface Things {
  readonly field: Field;
  readonly personId: string;
  readonly caseId: string;
  readonly organisation: 'ours' | 'theirs';
}

const everyone = roles;
const rows: Readonly<Record<RouteName, Row>> = {
  health: { may: 'open', ok: 200 },
  openapi: { may: 'open', ok: 200 },
  signIn: { may: 'open', body: () => ({ email: 'x@y.example', password: 'wrong' }), ok: 401 },
  session: { may: everyone, ok: 200 },
  refreshSession: { may: 'open', ok: 200 },
  signOut: { may: 'open', ok: 204 },
  people: { may: ['supervisor', 'administrator'], ok: 200 },
  person: {
    may: everyone,
    path: ({ personId }) => `/api/people/${personId}`,
    ok: 200,
    foreign: 404,
    // The thing is an engineer: others of the field do not see them.
    byRole: { technician: 404 },
  },
  changePerson: {
    may: ['administrator'],
    path: ({ personId }) => `/api/people/${personId}`,
    body: () => ({ name: 'Renamed' }),
    ifMatch: 1,
    ok: 200,
    foreign: 404,
  },
  lifts: { may: everyone, ok: 200 },
  lift: {
    may: everyone,
    path: ({ field }) => `/api/lifts/${field.liftId}`,
    ok: 200,
    foreign: 404,
  },
  changeLift: {
    may: ['engineer', 'administrator'],
    path: ({ field }) => `/api/lifts/${field.liftId}`,
    body: () => ({ notes: 'n' }),
    // An older version: allowed and understood, but too late.
    ifMatch: 99,
    ok: 412,
    foreign: 404,
  },
  circuit: {
    may: everyone,
    path: ({ field }) => `/api/circuits/${field.circuitId}/revisions/1`,
    ok: 200,
    foreign: 404,
  },
  checkCircuit: { may: ['engineer', 'administrator'], body: () => ({}), ok: 200 },
  pack: { may: everyone, ok: 200 },
  sendEvents: {
    may: everyone,
    body: ({ caseId }) => {
      const device = v7();
      const event = {
        id: v7(),
        caseId,
        device,
        sequence: 1,
        schema: 1,
        type: 'note written',
        payload: { text: 'n' },
        recordedAt: new Date().toISOString(),
        state: {},
      };
      return { device, events: [event] };
    },
    ok: 200,
    // Answered event by event: see below.
    foreign: 200,
  },
  feed: { may: everyone, ok: 200 },
  cases: { may: everyone, ok: 200 },
  case: { may: everyone, path: ({ caseId }) => `/api/cases/${caseId}`, ok: 200, foreign: 404 },
  reviewQueue: { may: ['supervisor'], ok: 200 },
};

let server: TestServer;
let ours: Things;
let theirs: Things;
beforeAll(async () => {
  server = await startTestServer();
  ours = await things('ours', 'AAAAAAA');
  theirs = await things('theirs', 'BBBBBBB');
});
afterAll(() => server.stop());

async function things(organisation: 'ours' | 'theirs', label: string): Promise<Things> {
  const field = await storeField(server, organisation, label);
  const phone = new TestPhone(server.as('technician', organisation));
  const opened = phone.open(field);
  await phone.send([opened]);
  const { personId } = server.fixtures[organisation].engineer;
  return { field, personId, caseId: opened.caseId, organisation };
}

const nameOf = ({ method, path }: Pick<Route, 'method' | 'path'>): string => `${method} ${path}`;

function ask(visitor: Visitor, name: RouteName, of: Things) {
  const row = rows[name];
  const { method, path } = routes[name];
  const address = row.path?.(of) ?? path;
  if (method === 'get') return visitor.get(address);
  return visitor[method](address, row.body?.(of), { ifMatch: row.ifMatch });
}

/** Routes as Express itself has them. */
function routed(): string[] {
  interface Layer {
    readonly route?: { readonly path: string; readonly methods: Readonly<Record<string, boolean>> };
  }
  const stack = (server.app as unknown as { router: { stack: readonly Layer[] } }).router.stack;
  return stack.flatMap(({ route }) =>
    route
      ? Object.keys(route.methods).map((method) => `${method.toLowerCase()} ${route.path}`)
      : [],
  );
}

describe('the matrix', () => {
  it('has a row for every route of the router, and a route for every row', () => {
    const named = (Object.keys(rows) as RouteName[]).map((name) => nameOf(routes[name]));
    expect(routed().sort()).toEqual(named.sort());
  });

  it.each(Object.keys(rows) as RouteName[])('says of %s who may as the router does', (name) => {
    const { may } = rows[name];
    const said: Route['roles'] = routes[name].roles;
    expect(may === 'open' ? may : [...may].sort()).toEqual(
      said === 'open' ? said : [...said].sort(),
    );
  });

  it.each(Object.keys(rows) as RouteName[])(
    'lets nobody in to %s without a sign-in',
    async (name) => {
      const { may, ok } = rows[name];
      const { status } = await ask(server.nobody, name, ours);
      expect(status).toBe(may === 'open' ? (name === 'refreshSession' ? 401 : ok) : 401);
    },
  );
});

// Signing out and refreshing change the session that the others use: they are tried above and in S7.
const settled = (Object.keys(rows) as RouteName[]).filter(
  (name) => name !== 'signOut' && name !== 'refreshSession' && name !== 'changePerson',
);

describe.each(settled)('%s', (name) => {
  it.each(roles)('answers %s by role and ownership', async (role) => {
    const { may, ok, foreign, byRole } = rows[name];
    const allowed = may === 'open' || may.includes(role);
    const own = await ask(server.as(role), name, ours);
    expect(own.status, 'own').toBe(allowed ? (byRole?.[role] ?? ok) : 403);
    if (foreign === undefined) return;
    const other = await ask(server.as(role), name, theirs);
    expect(other.status, 'foreign').toBe(allowed ? foreign : 403);
    if (name === 'sendEvents') {
      const { results } = other.body as { results: { outcome: string; code: string }[] };
      const code = role === 'administrator' ? 'role-not-allowed' : 'case-unknown';
      expect(results).toMatchObject([{ outcome: 'rejected', code }]);
    }
  });
});

describe('changePerson', () => {
  it.each(roles)('answers %s by role and ownership', async (role) => {
    const allowed = role === 'administrator';
    const own = await ask(server.as(role), 'changePerson', ours);
    expect(own.status).toBe(allowed ? 200 : 403);
    const other = await ask(server.as(role), 'changePerson', theirs);
    expect(other.status).toBe(allowed ? 404 : 403);
  });
});
