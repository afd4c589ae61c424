import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { RouterLink } from '@angular/router';
import { faultSentence } from '@shared/contract';
import { DeviceStore } from '../../core/device/device-store';
import { PageHeader } from '../../core/shell/page-header';

/** Lifts that the solver plays: each hides a fault, and the meter answers what the probes touch. */
@Component({
  selector: 'app-practice-page',
  imports: [PageHeader, RouterLink],
  templateUrl: './practice-page.html',
  styleUrl: './practice-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PracticePage {
  protected readonly store = inject(DeviceStore);
  protected readonly lifts = computed(() =>
    this.store.lifts().flatMap((lift) => {
      const circuit = this.store.circuit(lift.circuitId, lift.circuitRevision);
      if (!lift.practiceFaults || !circuit) return [];
      return [
        {
          id: lift.id,
          title: `${this.store.site(lift.siteId)?.name ?? ''}, ${lift.name}`,
          circuit: circuit.name,
          hunts: this.store.cases().filter(({ liftId, practice }) => practice && liftId === lift.id)
            .length,
          hidden: lift.practiceFaults.map(faultSentence).join('; '),
        },
      ];
    }),
  );
}
