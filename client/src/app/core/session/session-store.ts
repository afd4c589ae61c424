import { Injectable, computed, inject, signal } from '@angular/core';
import { routes, type Role, type Session } from '@shared/contract';
import { Api } from './api';
import { ApiError } from './api-error';
import { PHONE_DATABASE } from './phone-database';

/** Refresh this long before the access token ends, milliseconds. */
const BEFORE_END = 60_000;

/**
 * Who is signed in. The tokens are cookies that no script sees; here is only whose they are. Without
 * network the product opens for the last person of this phone and goes on recording.
 */
@Injectable({ providedIn: 'root' })
export class SessionStore {
  private readonly api = inject(Api);
  private readonly phone = inject(PHONE_DATABASE);
  private readonly current = signal<Session | undefined>(undefined);
  private readonly ended = signal(false);
  private refreshing?: Promise<boolean>;

  readonly session = this.current.asReadonly();
  /** The sign-in has ended while a person works on: sending waits until they sign in again. */
  readonly signInToSend = this.ended.asReadonly();
  readonly role = computed<Role | undefined>(() => this.current()?.person.role);

  /** Whom this phone is open for although their sign-in has ended: they record, and send later. */
  readonly offlineUser = computed(() => (this.ended() ? this.current()?.person : undefined));

  /** Before the first screen: from this phone, without waiting for the network. */
  async restore(): Promise<void> {
    try {
      this.current.set(await this.phone.last());
    } catch {
      // Without a store in this window a sign-in is needed; the sign-in page says what is missing.
      this.current.set(undefined);
    }
  }

  /** @throws ApiError */
  async signIn(email: string, password: string): Promise<Session> {
    const session = await this.api.call(routes.signIn, { body: { email, password } });
    await this.take(session);
    return session;
  }

  /** Ends the session on the server, if it can be reached, and closes the phone for this person. */
  async signOut(): Promise<void> {
    try {
      await this.phone.lock();
    } catch {
      // Nothing was kept that could open by itself.
    }
    this.current.set(undefined);
    this.ended.set(false);
    try {
      await this.api.call(routes.signOut);
    } catch (error) {
      // Without network the cookies stay until they end; the phone is closed all the same.
      if (!(error instanceof ApiError)) throw error;
    }
  }

  /**
   * Refreshes if the access token is about to end. False: nothing may be sent for this person now.
   * The cookies are one for all tabs: if another tab signed out, or someone else in, this one follows.
   */
  async fresh(now: number): Promise<boolean> {
    await this.follow();
    const session = this.current();
    if (!session || this.ended()) return false;
    return Date.parse(session.until) - now > BEFORE_END ? true : this.refresh();
  }

  /** One refresh at a time, however many ask. No answer counts as neither: the session stays. */
  refresh(): Promise<boolean> {
    this.refreshing ??= this.refreshOnce().finally(() => (this.refreshing = undefined));
    return this.refreshing;
  }

  private async follow(): Promise<void> {
    const last = await this.phone.last();
    if (last?.person.id !== this.current()?.person.id) this.current.set(last);
  }

  private async refreshOnce(): Promise<boolean> {
    try {
      const session = await this.api.call(routes.refreshSession);
      const same = session.person.id === this.current()?.person.id;
      // Whose cookies these are now is not whose queue this is.
      if (same) await this.take(session);
      else await this.follow();
      return same;
    } catch (error) {
      if (error instanceof ApiError && error.status === 401) this.ended.set(true);
      return false;
    }
  }

  private async take(session: Session): Promise<void> {
    try {
      await this.phone.keep(session);
    } catch {
      // This window can't keep anything: it works with signal, and the frame says what is missing.
    }
    this.current.set(session);
    this.ended.set(false);
  }
}
