import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { routes } from '@shared/contract';
import { Connection } from '../device/connection';
import { NEW_ID } from '../device/ids';
import { Api } from './api';
import { markInterceptor } from './mark-interceptor';
import { refreshInterceptor } from './refresh-interceptor';
import { SessionStore } from './session-store';

const ID = '0190a000-0000-7000-8000-00000000000a';

function started(refresh: () => Promise<boolean> = async () => false) {
  const refreshed = vi.fn(refresh);
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(withInterceptors([refreshInterceptor, markInterceptor])),
      provideHttpClientTesting(),
      { provide: NEW_ID, useValue: () => ID },
      { provide: SessionStore, useValue: { refresh: refreshed } },
    ],
  });
  return {
    refreshed,
    api: TestBed.inject(Api),
    http: TestBed.inject(HttpTestingController),
    connection: TestBed.inject(Connection),
  };
}

const problem = (status: number, code: string) => ({
  type: 'about:blank',
  title: 'x',
  status,
  code,
  detail: `sentence of ${code}`,
  requestId: ID,
});
/** Lets what waits for promises go on. */
const settled = () => new Promise((resolve) => setTimeout(resolve));

describe('a call', () => {
  it('fills the path, and marks the request as ours with an id', async () => {
    const { api, http } = started();
    const answer = api.call(routes.changeLift, {
      params: { id: ID },
      body: { notes: 'Key at the desk' },
      version: 3,
      key: 'k1',
    });
    const sent = http.expectOne(`/api/lifts/${ID}`);
    const { request } = sent;
    expect(request.method).toBe('PATCH');
    expect(request.headers.get('X-Lampline')).toBe('1');
    expect(request.headers.get('X-Request-Id')).toBe(ID);
    expect(request.headers.has('ngsw-bypass')).toBe(true);
    expect(request.headers.get('If-Match')).toBe('"3"');
    expect(request.headers.get('Idempotency-Key')).toBe('k1');
    sent.flush({ id: ID });
    expect(await answer).toEqual({ id: ID });
  });

  it('gives what went wrong as code, sentence and fields', async () => {
    const { api, http } = started();
    const answer = api.call(routes.signIn, { body: { email: 'x', password: 'y' } });
    const failed = expect(answer).rejects.toMatchObject({
      status: 400,
      code: 'invalid_request',
      detail: 'sentence of invalid_request',
      fields: [{ field: 'email', code: 'field.invalid_format' }],
    });
    http.expectOne('/api/session').flush(
      {
        ...problem(400, 'invalid_request'),
        fields: [{ field: 'email', code: 'field.invalid_format', detail: 'no address' }],
      },
      { status: 400, statusText: 'x' },
    );
    await failed;
  });

  it('reads how long the server wants quiet', async () => {
    const { api, http } = started();
    const failed = expect(api.call(routes.health)).rejects.toMatchObject({
      status: 429,
      retryAfterSeconds: 30,
    });
    http.expectOne('/api/health').flush(problem(429, 'busy'), {
      status: 429,
      statusText: 'x',
      headers: { 'Retry-After': '30' },
    });
    await failed;
  });

  it('does not take the page of something on the way for an answer of ours', async () => {
    const { api, http } = started();
    const failed = expect(api.call(routes.health)).rejects.toMatchObject({ code: 'unreadable' });
    http.expectOne('/api/health').flush('<h1>Bad gateway</h1>', { status: 502, statusText: 'x' });
    await failed;
  });

  it('without an answer says so, and the connection is known to be gone', async () => {
    const { api, http, connection } = started();
    const failed = expect(api.call(routes.health)).rejects.toMatchObject({
      status: 0,
      code: 'unreachable',
    });
    http.expectOne('/api/health').error(new ProgressEvent('error'));
    await failed;
    expect(connection.online()).toBe(false);
  });
});

describe('an access token that has ended', () => {
  it('is refreshed once, and the request is sent again', async () => {
    const { api, http, refreshed } = started(async () => true);
    const answer = api.call(routes.people);
    http.expectOne('/api/people').flush(problem(401, 'not_signed_in'), {
      status: 401,
      statusText: 'x',
    });
    await settled();
    http.expectOne('/api/people').flush({ people: [] });
    expect(await answer).toEqual({ people: [] });
    expect(refreshed).toHaveBeenCalledTimes(1);
  });

  it('that cannot be refreshed fails the request without a second one', async () => {
    const { api, http } = started(async () => false);
    const failed = expect(api.call(routes.people)).rejects.toMatchObject({ status: 401 });
    http.expectOne('/api/people').flush(problem(401, 'not_signed_in'), {
      status: 401,
      statusText: 'x',
    });
    await failed;
    http.verify();
  });

  it('is not asked for when a sign-in is refused', async () => {
    const { api, http, refreshed } = started(async () => true);
    const answer = api.call(routes.signIn, { body: { email: 'a@b.test', password: 'y' } });
    const failed = expect(answer).rejects.toMatchObject({ code: 'wrong_credentials' });
    http.expectOne('/api/session').flush(problem(401, 'wrong_credentials'), {
      status: 401,
      statusText: 'x',
    });
    await failed;
    expect(refreshed).not.toHaveBeenCalled();
  });
});
