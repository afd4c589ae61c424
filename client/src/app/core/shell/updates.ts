import { Injectable, inject, signal } from '@angular/core';
import { SwUpdate } from '@angular/service-worker';
import { filter } from 'rxjs';

/** A new version waits until the person takes it: a page with something typed in it never reloads. */
@Injectable({ providedIn: 'root' })
export class Updates {
  private readonly worker = inject(SwUpdate);
  private readonly waiting = signal(false);
  readonly ready = this.waiting.asReadonly();

  constructor() {
    this.worker.versionUpdates
      .pipe(filter(({ type }) => type === 'VERSION_READY'))
      .subscribe(() => this.waiting.set(true));
    // The kept files are broken: only the server can mend them.
    this.worker.unrecoverable.subscribe(() => location.reload());
  }

  /** Fetches what is newest, if the server can be reached, and starts it. */
  async take(): Promise<void> {
    try {
      if (this.worker.isEnabled) await this.worker.checkForUpdate();
    } catch {
      // Without network the version that is ready already is started.
    }
    location.reload();
  }
}
