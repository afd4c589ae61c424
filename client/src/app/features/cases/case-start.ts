import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { ActivatedRoute, Router } from '@angular/router';
import { CaseDesk } from './case-desk';
import { stageNow } from './case-stage';

/** Leads to the stage where the case goes on. */
@Component({
  selector: 'app-case-start',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CaseStart {
  private readonly desk = inject(CaseDesk);
  private readonly router = inject(Router);
  private readonly route = inject(ActivatedRoute);

  constructor() {
    // The case may still be on its way out of the store when this opens.
    effect(() => {
      const state = this.desk.state();
      if (state) {
        void this.router.navigate([stageNow(state)], {
          relativeTo: this.route.parent,
          replaceUrl: true,
        });
      }
    });
  }
}
