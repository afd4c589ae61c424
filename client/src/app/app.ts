import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { Frame } from './core/shell/frame';
import { DeviceStore } from './core/device/device-store';
import { Sync } from './core/device/sync';
import { SessionStore } from './core/session/session-store';
import { ThemeChoice } from './core/shell/theme-choice';
import { Updates } from './core/shell/updates';

@Component({
  selector: 'app-root',
  imports: [Frame],
  template: '<app-frame />',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class App {
  constructor() {
    inject(ThemeChoice);
    inject(Updates);
    const store = inject(DeviceStore);
    const sync = inject(Sync);
    const sessions = inject(SessionStore);
    effect(() => {
      const session = sessions.session();
      if (!session) store.close();
      else void store.open(session).then(() => sync.syncNow());
    });
  }
}
