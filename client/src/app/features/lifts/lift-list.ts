import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
} from '@angular/core';
import { FormsModule } from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import { labelCodeSchema } from '@shared/contract';
import { liftSearch } from '@shared/search';
import { Connection } from '../../core/device/connection';
import { DeviceStore } from '../../core/device/device-store';
import { Sync } from '../../core/device/sync';
import { PageHeader } from '../../core/shell/page-header';
import { liftGroups } from './lift-groups';

/** Lifts of this phone: searched by site, name, maker, or the code on the label. */
@Component({
  selector: 'app-lift-list',
  imports: [FormsModule, PageHeader, RouterLink],
  templateUrl: './lift-list.html',
  styleUrl: './lift-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LiftList {
  /** A label code that this phone did not know; from the address. */
  readonly label = input<string>();

  protected readonly store = inject(DeviceStore);
  protected readonly online = inject(Connection).online;
  private readonly sync = inject(Sync);
  private readonly router = inject(Router);

  protected readonly query = signal('');
  protected readonly searching = signal(false);
  private readonly search = computed(() =>
    liftSearch(
      this.store.lifts().map(({ id, name, siteId, label, maker, controller }) => {
        const site = this.store.site(siteId);
        return {
          id,
          name,
          label,
          maker,
          controller,
          site: site?.name ?? '',
          address: site?.address ?? '',
        };
      }),
    ),
  );
  protected readonly groups = computed(() =>
    liftGroups(
      this.store.sites(),
      this.store.lifts(),
      this.store.cases(),
      this.search().find(this.query()),
    ),
  );
  /** A whole label code that no lift of this phone has. */
  protected readonly unknownLabel = computed(() => {
    const code = labelCodeSchema.safeParse(this.query());
    const known = code.success && this.store.lifts().some(({ label }) => label === code.data);
    return code.success && !known ? code.data : undefined;
  });

  constructor() {
    effect(() => {
      const label = this.label();
      if (label) this.query.set(label);
    });
  }

  /** Enter on a whole code opens its lift. */
  protected async open(): Promise<void> {
    const code = this.query().trim().toUpperCase();
    const lift = this.store.lifts().find(({ label }) => label === code);
    if (lift) await this.router.navigate(['/lifts', lift.id]);
  }

  protected async askServer(): Promise<void> {
    this.searching.set(true);
    await this.sync.refreshNow();
    this.searching.set(false);
    await this.open();
  }
}
