import { Injectable, signal } from '@angular/core';

/** Whether the browser promised not to clear this phone's store by itself, and what the store takes. */
@Injectable({ providedIn: 'root' })
export class StorageGrant {
  private readonly promised = signal<boolean | undefined>(undefined);
  private readonly used = signal<number | undefined>(undefined);
  /** Undefined until known, or where the browser does not say. */
  readonly granted = this.promised.asReadonly();
  /** Bytes. */
  readonly bytes = this.used.asReadonly();

  async look(): Promise<void> {
    try {
      this.promised.set(await navigator.storage?.persisted?.());
      this.used.set((await navigator.storage?.estimate?.())?.usage);
    } catch {
      // A browser that will not say has not promised.
      this.promised.set(undefined);
    }
  }

  /** After a touch of the person's: browsers listen to nothing else. */
  async ask(): Promise<void> {
    try {
      await navigator.storage?.persist?.();
    } catch {
      // Refusing is its right; the answer below is what counts.
    }
    await this.look();
  }
}
