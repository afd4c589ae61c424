import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { Circuit } from '@shared/circuit';

/** Black on the left, red on the right, as the leads hang. Touching swaps them. */
@Component({
  selector: 'app-probe-cards',
  template: `
    @for (probe of probes(); track probe.colour) {
      <div class="probe" [class]="probe.colour">
        <svg viewBox="0 0 16 46" aria-hidden="true">
          <rect x="1" y="1" width="14" height="34" rx="5" />
          <path d="M8 35v10" />
        </svg>
        <p>
          <strong>{{ probe.tag }}</strong>
          <span>{{ probe.word }}</span>
        </p>
      </div>
    }
    <button type="button" (click)="swap.emit()" i18n-aria-label aria-label="Swap the probes">
      <span class="sign" aria-hidden="true">⇄</span>
    </button>
  `,
  styles: `
    :host {
      position: relative;
      display: grid;
      grid-template-columns: repeat(2, minmax(0, 1fr));
      gap: 8px;
    }
    .probe {
      display: grid;
      grid-template-columns: 16px minmax(0, 1fr);
      gap: 10px;
      align-items: center;
      min-height: 64px;
      padding: 6px 14px 6px 10px;
      border: 1px solid var(--edge);
      border-radius: var(--corner);
      background: var(--panel);
    }
    svg {
      height: 42px;
      fill: #050505;
      stroke: var(--edge);
      stroke-width: 1.5;
    }
    .red svg {
      fill: #d8402f;
    }
    svg path {
      stroke: var(--soft);
      stroke-width: 3;
    }
    strong {
      display: block;
      overflow-wrap: anywhere;
      font-size: var(--text-24);
      line-height: 1.15;
    }
    span {
      color: var(--soft);
      font-size: var(--text-12);
      line-height: 1.25;
      display: block;
    }
    .sign {
      display: grid;
      place-items: center;
      width: 26px;
      height: 26px;
      margin: auto;
      border: 1px solid var(--edge);
      border-radius: 50%;
      background: var(--ground);
      color: var(--ink);
      font-size: var(--text-13);
      line-height: 1;
    }
    button {
      position: absolute;
      top: 50%;
      left: 50%;
      width: 48px;
      height: 48px;
      border: 0;
      background: none;
      color: var(--ink);
      font-size: var(--text-15);
      transform: translate(-50%, -50%);
      cursor: pointer;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProbeCards {
  readonly circuit = input.required<Circuit>();
  readonly red = input.required<string>();
  readonly black = input.required<string>();
  readonly swap = output();

  protected readonly probes = computed(() => [
    { colour: 'black', tag: this.black(), word: this.word($localize`black`, this.black()) },
    { colour: 'red', tag: this.red(), word: this.word($localize`red`, this.red()) },
  ]);

  private word(colour: string, tag: string): string {
    const label = this.circuit().terminals.find((each) => each.tag === tag)?.label;
    return label ? `${colour}, ${label}` : colour;
  }
}
