import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import type { RelayPosition } from '@shared/circuit';
import { cautionSentences } from '@shared/contract';
import { CaseDesk } from '../case-desk';
import { RelayLook } from '../../../ui/relay-look';

type Yes = boolean | undefined;

/** Arriving: people first, then what can be seen without a tool. */
@Component({
  selector: 'app-arrive',
  imports: [RelayLook, RouterLink],
  templateUrl: './arrive.html',
  styleUrls: ['../stage.scss', './arrive.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Arrive {
  protected readonly desk = inject(CaseDesk);
  private readonly router = inject(Router);
  private readonly route = inject(ActivatedRoute);

  protected readonly peopleSafe = signal<Yes>(undefined);
  protected readonly noticesUp = signal<Yes>(undefined);
  protected readonly meterProven = signal<Yes>(undefined);
  protected readonly linksFound = signal(0);
  protected readonly tried = signal(false);
  protected readonly busy = signal(false);

  protected readonly may = cautionSentences('may start when cleared');
  protected readonly live = cautionSentences('live terminals');
  protected readonly places = computed(() => this.desk.circuit()?.places ?? []);
  protected readonly relays = this.desk.relays;
  /** As last seen in this case. */
  protected readonly seen = computed(() => {
    const positions = new Map<string, RelayPosition>();
    for (const { observation } of this.desk.state()?.seen ?? []) {
      if (observation.kind === 'relay') positions.set(observation.relay, observation.position);
    }
    return positions;
  });
  protected readonly missing = computed(
    () => this.peopleSafe() !== true || this.noticesUp() === undefined || !this.meterProven(),
  );

  protected count(by: number): void {
    this.linksFound.update((links) => Math.max(0, Math.min(50, links + by)));
  }

  protected async look(relay: string, position: RelayPosition): Promise<void> {
    await this.desk.add('relay seen', { relay, position });
  }

  protected async lookAll(): Promise<void> {
    const positions = await this.desk.practiceRelays();
    for (const relay of this.relays()) {
      const position = positions[relay];
      if (position && this.seen().get(relay) !== position) await this.look(relay, position);
    }
  }

  protected async stand(place: string): Promise<void> {
    await this.desk.add('place changed', { place });
  }

  protected async arrived(): Promise<void> {
    this.tried.set(true);
    if (this.missing() || this.busy()) return;
    this.busy.set(true);
    const kept = await this.desk.add('arrival checked', {
      peopleSafe: this.peopleSafe() === true,
      noticesUp: this.noticesUp() === true,
      meterProven: this.meterProven() === true,
      linksFound: this.linksFound(),
    });
    this.busy.set(false);
    if (!kept) return;
    const next = this.linksFound() > 0 ? 'links' : 'find';
    await this.router.navigate(['..', next], { relativeTo: this.route });
  }
}
