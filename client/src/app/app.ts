import { ChangeDetectionStrategy, Component, effect, inject, untracked } from '@angular/core';
import { Router } from '@angular/router';
import { DeviceStore } from './core/device/device-store';
import { Sync } from './core/device/sync';
import { SessionStore } from './core/session/session-store';
import { Frame } from './core/shell/frame';
import { ThemeChoice } from './core/shell/theme-choice';
import { Updates } from './core/shell/updates';

@Component({
  selector: 'app-root',
  imports: [Frame],
  template: '<app-frame />',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class App {
  private readonly store = inject(DeviceStore);
  private readonly sync = inject(Sync);
  private readonly router = inject(Router);

  constructor() {
    inject(ThemeChoice);
    inject(Updates);
    const sessions = inject(SessionStore);
    effect(() => {
      const session = sessions.session();
      untracked(() => {
        if (session) void this.store.open(session).then(() => this.sync.syncNow());
        else void this.leave();
      });
    });
  }

  /** Signed out, here or in another tab: nothing of the person stays on the screen. */
  private async leave(): Promise<void> {
    if (!this.router.navigated || this.router.url.startsWith('/sign-in')) this.store.close();
    else {
      await this.router.navigateByUrl('/sign-in');
      this.store.close();
    }
  }
}
