import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatProgressBar } from '@angular/material/progress-bar';
import { Router } from '@angular/router';
import { CLIENT_BUILD } from '../../core/device/client-build';
import { CLOCK } from '../../core/device/clock';
import { Connection } from '../../core/device/connection';
import { DeviceStore } from '../../core/device/device-store';
import { StorageGrant } from '../../core/device/storage-grant';
import { Sync } from '../../core/device/sync';
import { SessionStore } from '../../core/session/session-store';
import { LocalTime } from '../../core/shell/local-time';
import { PageHeader } from '../../core/shell/page-header';
import { roleNames } from '../../core/shell/role-names';
import { ThemeChoice, type Theme } from '../../core/shell/theme-choice';
import { OwnEvents } from './own-events';
import { sendingWords } from './sending-words';
import { save, unsentFile } from './unsent-file';

/** Bytes in the unit shown. */
const MEGABYTE = 1_000_000;

/** What this phone keeps, what it has not sent and why, and what it promises to keep. */
@Component({
  selector: 'app-phone-page',
  imports: [LocalTime, MatProgressBar, OwnEvents, PageHeader],
  templateUrl: './phone-page.html',
  styleUrl: './phone-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PhonePage {
  private readonly store = inject(DeviceStore);
  private readonly sync = inject(Sync);
  private readonly sessions = inject(SessionStore);
  private readonly clock = inject(CLOCK);
  private readonly router = inject(Router);
  private readonly themeChoice = inject(ThemeChoice);
  private readonly online = inject(Connection).online;
  private readonly grant = inject(StorageGrant);

  protected readonly waiting = this.store.waiting;
  protected readonly refused = this.sync.quarantine;
  protected readonly lastContact = this.sync.lastContact;
  protected readonly pack = this.store.packOf;
  protected readonly cases = this.store.cases;
  protected readonly status = this.store.status;
  protected readonly session = this.sessions.session;
  protected readonly granted = this.grant.granted;
  protected readonly highContrast = this.themeChoice.highContrast;
  protected readonly theme = this.themeChoice.theme;
  protected readonly build = CLIENT_BUILD;
  protected readonly sureToLeave = signal(false);
  protected readonly working = computed(() => this.sync.status().kind === 'working');
  protected readonly why = computed(() => sendingWords(this.sync.status(), this.online()));
  protected readonly unsent = computed(() => this.waiting().length + this.refused().length);
  protected readonly megabytes = computed(() => {
    const bytes = this.grant.bytes();
    return bytes === undefined ? undefined : Math.max(0.1, bytes / MEGABYTE).toFixed(1);
  });
  protected readonly role = computed(() => {
    const role = this.sessions.role();
    return role ? roleNames[role] : '';
  });
  protected readonly themes: readonly { readonly theme: Theme; readonly name: string }[] = [
    { theme: 'auto', name: $localize`As the phone` },
    { theme: 'dark', name: $localize`Dark` },
    { theme: 'daylight', name: $localize`Daylight` },
  ];

  constructor() {
    void this.grant.look();
  }

  protected sendNow(): void {
    void this.sync.syncNow();
  }

  protected askToKeep(): void {
    void this.grant.ask();
  }

  protected saveUnsent(): void {
    const person = this.session()?.person.name ?? '';
    save(unsentFile(person, [...this.waiting(), ...this.refused()], this.clock.now()));
  }

  protected choose(theme: Theme): void {
    this.themeChoice.theme.set(theme);
  }

  protected chooseContrast(event: Event): void {
    this.themeChoice.highContrast.set((event.target as HTMLInputElement).checked);
  }

  /** With unsent events the first touch only says what will happen to them. */
  protected async signOut(): Promise<void> {
    if (this.unsent() > 0 && !this.sureToLeave()) {
      this.sureToLeave.set(true);
      return;
    }
    await this.sessions.signOut();
    await this.router.navigateByUrl('/sign-in');
  }
}
