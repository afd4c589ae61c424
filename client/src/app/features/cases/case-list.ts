import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { CaseState, CaseStatus } from '@shared/cases';
import { DeviceStore } from '../../core/device/device-store';
import { PageHeader } from '../../core/shell/page-header';

/** Cases that this phone holds: those with a question first, then open ones, then the rest. */
@Component({
  selector: 'app-case-list',
  imports: [DatePipe, PageHeader, RouterLink],
  templateUrl: './case-list.html',
  styleUrl: './case-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CaseList {
  protected readonly store = inject(DeviceStore);
  protected readonly groups = computed(() => {
    const cases = this.store.cases();
    return groups
      .map((group) => ({ ...group, cases: cases.filter(({ status }) => status === group.status) }))
      .filter((group) => group.cases.length > 0);
  });

  protected titleOf(state: CaseState): string {
    const lift = this.store.lift(state.liftId);
    const site = lift && this.store.site(lift.siteId);
    return lift
      ? `${site ? `${site.name}, ` : ''}${lift.name}`
      : $localize`A lift not on this phone`;
  }

  protected whatOf({ finding, complaint }: CaseState): string {
    return finding ? `${finding.device}: ${finding.cause}` : complaint;
  }
}

const groups: readonly { readonly status: CaseStatus; readonly heading: string }[] = [
  { status: 'returned', heading: $localize`A question waits for you` },
  { status: 'open', heading: $localize`Open` },
  { status: 'closed', heading: $localize`Closed, to be reviewed` },
  { status: 'accepted', heading: $localize`Accepted` },
];
