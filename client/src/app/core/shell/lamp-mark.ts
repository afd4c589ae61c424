import { ChangeDetectionStrategy, Component } from '@angular/core';

/** The product's mark: a lamp on its line. */
@Component({
  selector: 'app-lamp-mark',
  template: `
    <svg viewBox="0 0 40 40" aria-hidden="true">
      <path class="line" d="M20 1v8M20 31v8" />
      <circle class="lamp" cx="20" cy="20" r="11" />
      <path class="cross" d="M14 14l12 12M26 14L14 26" />
    </svg>
  `,
  styles: `
    :host {
      display: inline-block;
      width: 40px;
      height: 40px;
    }
    .line {
      stroke: var(--lamp);
      stroke-width: 3;
    }
    .lamp {
      fill: var(--lamp);
    }
    .cross {
      stroke: var(--lamp-ink);
      stroke-width: 3;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LampMark {}
