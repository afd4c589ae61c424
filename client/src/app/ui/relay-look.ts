import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { RelayPosition } from '@shared/circuit';

/** One look at a relay: in, out, or chattering. */
@Component({
  selector: 'app-relay-look',
  template: `
    <p [id]="'relay-' + relay()">
      <ng-container i18n>Relay {{ relay() }}</ng-container>
    </p>
    <div role="group" [attr.aria-labelledby]="'relay-' + relay()">
      @for (choice of choices; track choice.position) {
        <button
          type="button"
          class="action"
          [class.glove]="glove()"
          [attr.aria-pressed]="position() === choice.position"
          (click)="seen.emit(choice.position)"
        >
          {{ choice.label }}
        </button>
      }
    </div>
  `,
  styles: `
    :host {
      display: grid;
      gap: 6px;
    }
    p {
      font-weight: 600;
    }
    div {
      display: grid;
      grid-template-columns: repeat(3, 1fr);
      gap: 6px;
    }
    .action {
      padding: 4px;
    }
    [aria-pressed='true'] {
      border-color: var(--ink);
      background: var(--raised);
      box-shadow: inset 0 0 0 1px var(--ink);
    }
    [aria-pressed='true']::before {
      content: '✓';
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RelayLook {
  readonly relay = input.required<string>();
  readonly position = input<RelayPosition>();
  readonly glove = input(false);
  readonly seen = output<RelayPosition>();

  protected readonly choices: readonly {
    readonly position: RelayPosition;
    readonly label: string;
  }[] = [
    { position: 'in', label: $localize`in` },
    { position: 'out', label: $localize`out` },
    { position: 'chatter', label: $localize`chatters` },
  ];
}
