import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { Outcome } from '@shared/diagnosis';
import type { LampLevel } from '../../../ui/line-model';
import { LampSign } from '../../../ui/lamp';

/** What each outcome of the reading would leave. */
@Component({
  selector: 'app-outcome-rows',
  imports: [LampSign],
  template: `
    <ul i18n-aria-label aria-label="What each outcome would mean">
      @for (outcome of outcomes(); track $index) {
        <li>
          <app-lamp [level]="levelOf(outcome)" />
          <strong>{{ valueOf(outcome) }}</strong>
          <span>{{ meaningOf(outcome) }}</span>
        </li>
      }
    </ul>
  `,
  styles: `
    li {
      display: grid;
      grid-template-columns: 26px 74px minmax(0, 1fr);
      gap: 6px;
      align-items: center;
      min-height: 28px;
      font-size: var(--text-13);
      line-height: 1.25;
    }
    app-lamp {
      width: 26px;
      height: 26px;
    }
    span {
      color: var(--soft);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OutcomeRows {
  readonly outcomes = input.required<readonly Outcome[]>();
  /** The string's nominal volts. */
  readonly volts = input.required<number>();

  protected levelOf({ band }: Outcome): LampLevel {
    return band === 'full' || band === 'in' ? 'live' : band === 'between' ? 'between' : 'none';
  }

  protected valueOf({ band, fromVolts, toVolts }: Outcome): string {
    if (band === 'full') return $localize`about ${this.volts()}:volts:`;
    if (band === 'none') return $localize`near 0`;
    if (fromVolts !== undefined && toVolts !== undefined) {
      return `${fromVolts.toFixed(0)}–${toVolts.toFixed(0)}`;
    }
    return $localize`between`;
  }

  protected meaningOf({ leaves, stretch, probability }: Outcome): string {
    const percent = Math.round(probability * 100);
    const share = percent < 1 ? $localize`hardly likely` : $localize`${percent}:percent: in 100`;
    const what = stretch
      ? $localize`${stretch[0]}:from: to ${stretch[1]}:to:`
      : leaves.slice(0, 2).join(', ') + (leaves.length > 2 ? ' …' : '');
    return what ? `${what} · ${share}` : share;
  }
}
