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
    await this.phone.lock();
    this.current.set(undefined);
    this.ended.set(false);
    try {
      await this.api.call(routes.signOut);
    } catch (error) {
      // Without network the cookies stay until they end; the phone is closed all the same.
      if (!(error instanceof ApiError)) throw error;
    }
  }

  /** Refreshes if the access token is about to end. False: someone must sign in again to send. */
  async fresh(now: number): Promise<boolean> {
    const session = this.current();
    if (!session || this.ended()) return false;
    return Date.parse(session.until) - now > BEFORE_END ? true : this.refresh();
  }

  /** One refresh at a time, however many ask. No answer counts as neither: the session stays. */
  refresh(): Promise<boolean> {
    this.refreshing ??= this.refreshOnce().finally(() => (this.refreshing = undefined));
    return this.refreshing;
  }

  private async refreshOnce(): Promise<boolean> {
    try {
      await this.take(await this.api.call(routes.refreshSession));
      return true;
    } catch (error) {
      if (error instanceof ApiError && error.status === 401) this.ended.set(true);
      return false;
    }
  }

  private async take(session: Session): Promise<void> {
    await this.phone.keep(session);
    this.current.set(session);
    this.ended.set(false);
  }
}
