import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
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
  constructor() {
    const state = inject(CaseDesk).state();
    if (state) {
      void inject(Router).navigate([stageNow(state)], {
        relativeTo: inject(ActivatedRoute).parent,
        replaceUrl: true,
      });
    }
  }
}
