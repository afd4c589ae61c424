import { TestBed } from '@angular/core/testing';
import { routes, type Session } from '@shared/contract';
import { IDBFactory, IDBKeyRange } from 'fake-indexeddb';
import { START, technician } from '../device/in-memory-phone';
import { Api } from './api';
import { ApiError } from './api-error';
import { PHONE_DATABASE, PhoneDatabase } from './phone-database';
import { SessionStore } from './session-store';

const supervisor: Session = {
  ...technician,
  person: { id: '0190a000-0000-7000-8000-00000000000a', name: 'Ines Okafor', role: 'supervisor' },
};
const later: Session = { ...technician, until: new Date(START + 1_200_000).toISOString() };

function opened(indexedDB = new IDBFactory()) {
  const call = vi.fn<(route: unknown) => Promise<unknown>>();
  TestBed.resetTestingModule();
  TestBed.configureTestingModule({
    providers: [
      { provide: Api, useValue: { call } },
      { provide: PHONE_DATABASE, useValue: new PhoneDatabase({ indexedDB, IDBKeyRange }) },
    ],
  });
  return { indexedDB, call, sessions: TestBed.inject(SessionStore) };
}

async function signedIn() {
  const phone = opened();
  phone.call.mockResolvedValueOnce(technician);
  await phone.sessions.signIn('mara@example.test', 'correct horse');
  phone.call.mockClear();
  return phone;
}

describe('who this phone is open for', () => {
  it('is nobody at first', async () => {
    const { sessions } = opened();
    await sessions.restore();
    expect(sessions.session()).toBeUndefined();
  });

  it('is the last person, without asking the network', async () => {
    const { indexedDB } = await signedIn();
    const { call, sessions } = opened(indexedDB);
    await sessions.restore();
    expect(sessions.session()).toEqual(technician);
    expect(sessions.role()).toBe('technician');
    expect(call).not.toHaveBeenCalled();
  });

  it('is nobody after signing out, with network or without', async () => {
    const { indexedDB, call, sessions } = await signedIn();
    call.mockRejectedValueOnce(new ApiError(0, 'unreachable', ''));
    await sessions.signOut();
    expect(sessions.session()).toBeUndefined();
    const again = opened(indexedDB).sessions;
    await again.restore();
    expect(again.session()).toBeUndefined();
  });

  it('stays who it was when a sign-in is refused', async () => {
    const { call, sessions } = await signedIn();
    call.mockRejectedValueOnce(new ApiError(401, 'wrong_credentials', ''));
    await expect(sessions.signIn('x@example.test', 'y')).rejects.toMatchObject({
      code: 'wrong_credentials',
    });
    expect(sessions.session()).toEqual(technician);
  });

  it('keeps no token: what is stored is exactly who, where and until when', async () => {
    const { indexedDB } = await signedIn();
    const kept = await new PhoneDatabase({ indexedDB, IDBKeyRange }).last();
    expect(Object.keys(kept!).sort()).toEqual(['organisation', 'person', 'until']);
  });
});

describe('the access token', () => {
  it('is refreshed shortly before its end, and not earlier', async () => {
    const { call, sessions } = await signedIn();
    expect(await sessions.fresh(START)).toBe(true);
    expect(call).not.toHaveBeenCalled();
    call.mockResolvedValueOnce(later);
    expect(await sessions.fresh(Date.parse(technician.until) - 1_000)).toBe(true);
    expect(call).toHaveBeenCalledExactlyOnceWith(routes.refreshSession);
    expect(sessions.session()).toEqual(later);
  });

  it('is asked for once, however many need it', async () => {
    const { call, sessions } = await signedIn();
    call.mockResolvedValue(later);
    expect(await Promise.all([1, 2, 3, 4].map(() => sessions.refresh()))).toEqual(
      Array.from({ length: 4 }, () => true),
    );
    expect(call).toHaveBeenCalledTimes(1);
  });

  it('that can no longer be refreshed leaves the phone open, and says that a sign-in is due', async () => {
    const { call, sessions } = await signedIn();
    call.mockRejectedValueOnce(new ApiError(401, 'not_signed_in', ''));
    expect(await sessions.refresh()).toBe(false);
    expect(sessions.session()).toEqual(technician);
    expect(sessions.signInToSend()).toBe(true);
    expect(sessions.offlineUser()).toEqual(technician.person);
    call.mockResolvedValueOnce(later);
    await sessions.signIn('mara@example.test', 'correct horse');
    expect(sessions.signInToSend()).toBe(false);
  });

  it('that nobody answered for changes nothing', async () => {
    const { call, sessions } = await signedIn();
    call.mockRejectedValueOnce(new ApiError(0, 'unreachable', ''));
    expect(await sessions.refresh()).toBe(false);
    expect(sessions.signInToSend()).toBe(false);
  });
});

describe('several tabs', () => {
  it('follow when another person signs in in one of them', async () => {
    const { indexedDB, sessions } = await signedIn();
    await new PhoneDatabase({ indexedDB, IDBKeyRange }).keep(supervisor);
    await sessions.fresh(START);
    expect(sessions.session()).toEqual(supervisor);
  });

  it('follow when one of them signs out', async () => {
    const { indexedDB, sessions } = await signedIn();
    await new PhoneDatabase({ indexedDB, IDBKeyRange }).lock();
    expect(await sessions.fresh(START)).toBe(false);
    expect(sessions.session()).toBeUndefined();
  });

  it("do not take another person's cookies for this person's", async () => {
    const { call, sessions } = await signedIn();
    call.mockResolvedValueOnce(supervisor);
    expect(await sessions.refresh()).toBe(false);
    expect(sessions.session()).toEqual(technician);
  });
});
