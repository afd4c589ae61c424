import { ChangeDetectionStrategy, Component, computed, effect, inject, input } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { RouterLink, RouterLinkActive, RouterOutlet } from '@angular/router';
import { map, timer } from 'rxjs';
import { CLOCK } from '../../core/device/clock';
import { DeviceStore } from '../../core/device/device-store';
import { KeptChip } from '../../core/shell/kept-chip';
import { CaseDesk } from './case-desk';
import { StopSign } from './stop-sign';
import { stages, stagesDone, type Stage } from './case-stage';

/** The frame of one case: what it is about, where one stands in it, and the stage below. */
@Component({
  selector: 'app-case-page',
  imports: [KeptChip, RouterLink, RouterLinkActive, RouterOutlet, StopSign],
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

  private readonly clock = inject(CLOCK);
  private readonly now = toSignal(timer(TICK, TICK).pipe(map(() => this.clock.now())), {
    initialValue: this.clock.now(),
  });
  /** Since the case was opened. */
  protected readonly minutes = computed(() => {
    const opened = Date.parse(this.desk.state()?.openedAt ?? '');
    return Number.isNaN(opened) ? 0 : Math.max(0, Math.floor((this.now() - opened) / MINUTE));
  });

  constructor() {
    effect(() => this.desk.caseId.set(this.caseId()));
  }
}

const MINUTE = 60_000;
/** How often the minutes in the head are looked at, milliseconds. */
const TICK = 15_000;

const stageNames: Readonly<Record<Stage, string>> = {
  arrive: $localize`Arrive`,
  find: $localize`Find`,
  repair: $localize`Repair`,
  prove: $localize`Prove`,
  close: $localize`Close`,
};
