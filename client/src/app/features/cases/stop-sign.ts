import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { dangerSentence } from '@shared/contract';
import type { Danger } from '@shared/diagnosis';

/** The full-width stop: what was found, what to do before anything else, and that it stays. */
@Component({
  selector: 'app-stop-sign',
  imports: [RouterLink],
  template: `
    <div role="alert">
      <svg viewBox="0 0 24 24" aria-hidden="true">
        <path d="M8 2.5h8L21.5 8v8L16 21.5H8L2.5 16V8z" />
        <path d="M12 7v6M12 16.5v.01" />
      </svg>
      <div>
        <strong i18n>Stop. The string does not protect.</strong>
        @for (sentence of sentences(); track sentence) {
          <p>{{ sentence }}</p>
        }
        @if (isolated()) {
          <p i18n>
            Isolated. Keep people away; tell your supervisor. Only a named supervisor releases this.
          </p>
        } @else {
          <p i18n>Isolate and lock off now. Keep people away. Tell your supervisor.</p>
          <a class="action" routerLink="isolate" i18n>Isolate, step by step</a>
        }
      </div>
    </div>
  `,
  styles: `
    [role='alert'] {
      display: grid;
      grid-template-columns: 40px minmax(0, 1fr);
      gap: 12px;
      padding: 12px 14px;
      background: var(--stop);
      color: var(--stop-ink);
    }
    svg {
      width: 40px;
      fill: none;
      stroke: currentcolor;
      stroke-width: 2;
      stroke-linecap: round;
    }
    strong {
      font-size: var(--text-19);
      line-height: 1.25;
    }
    p {
      font-size: var(--text-13);
    }
    .action {
      margin-top: 8px;
      border-color: currentcolor;
      color: inherit;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StopSign {
  readonly dangers = input.required<readonly Pick<Danger, 'code' | 'part'>[]>();
  readonly isolated = input(false);

  protected readonly sentences = computed(() => [...new Set(this.dangers().map(dangerSentence))]);
}
