import { ChangeDetectionStrategy, Component } from '@angular/core';

/** The full-width stop: what to do before anything else. */
@Component({
  selector: 'app-stop-sign',
  template: `
    <div role="alert">
      <strong i18n>Stop. The string does not protect.</strong>
      <p i18n>
        Isolate and lock off. Keep people away from the car and the landings. Tell your supervisor
        now. This case can't be closed as a repair until a named supervisor releases it.
      </p>
    </div>
  `,
  styles: `
    div {
      padding: 14px 16px;
      background: var(--stop);
      color: var(--stop-ink);
    }
    strong {
      font-size: var(--text-19);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StopSign {}
