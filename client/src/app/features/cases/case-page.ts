import { ChangeDetectionStrategy, Component, computed, effect, inject, input } from '@angular/core';
import { RouterLink, RouterLinkActive, RouterOutlet } from '@angular/router';
import { DeviceStore } from '../../core/device/device-store';
import { KeptChip } from '../../core/shell/kept-chip';
import { CaseDesk } from './case-desk';
import { stages, stagesDone, type Stage } from './case-stage';

/** The frame of one case: what it is about, where one stands in it, and the stage below. */
@Component({
  selector: 'app-case-page',
  imports: [KeptChip, RouterLink, RouterLinkActive, RouterOutlet],
  providers: [CaseDesk],
  templateUrl: './case-page.html',
  styleUrl: './case-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CasePage {
  readonly caseId = input.required<string>();

  protected readonly desk = inject(CaseDesk);
  protected readonly storeStatus = inject(DeviceStore).status;
  protected readonly heading = computed(() => {
    const [lift, site] = [this.desk.lift(), this.desk.site()];
    return lift ? `${site ? `${site.name}, ` : ''}${lift.name}` : '';
  });
  protected readonly linksOut = computed(
    () => this.desk.state()?.links.filter(({ removedAt }) => !removedAt).length ?? 0,
  );
  protected readonly steps = computed(() => {
    const state = this.desk.state();
    const done = state ? stagesDone(state) : new Set<Stage>();
    return stages.map((stage) => ({ stage, label: stageNames[stage], done: done.has(stage) }));
  });

  constructor() {
    effect(() => this.desk.caseId.set(this.caseId()));
  }
}

const stageNames: Readonly<Record<Stage, string>> = {
  arrive: $localize`Arrive`,
  find: $localize`Find`,
  repair: $localize`Repair`,
  prove: $localize`Prove`,
  close: $localize`Close`,
};
