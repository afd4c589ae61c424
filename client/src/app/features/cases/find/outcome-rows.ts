import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Outcome } from '@shared/diagnosis';
import type { LampLevel } from '../../../ui/line-model';
import { LampSign } from '../../../ui/lamp';
import { outcomeRows, type OutcomeRow } from './outcome-model';

/** What each outcome of the reading would leave. */
@Component({
  selector: 'app-outcome-rows',
  imports: [LampSign],
  template: `
    <ul i18n-aria-label aria-label="What each outcome would mean">
      @for (outcome of rows(); track outcome.band) {
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
      grid-template-columns: 24px 68px minmax(0, 1fr);
      gap: 6px;
      align-items: center;
      min-height: 26px;
      font-size: var(--text-13);
      line-height: 1.25;
    }
    app-lamp {
      width: 24px;
      height: 24px;
    }
    span {
      overflow: hidden;
      color: var(--soft);
      text-overflow: ellipsis;
      white-space: nowrap;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OutcomeRows {
  readonly outcomes = input.required<readonly Outcome[]>();
  /** The string's nominal volts. */
  readonly volts = input.required<number>();

  protected readonly rows = computed(() => outcomeRows(this.outcomes()));

  protected levelOf({ band }: OutcomeRow): LampLevel {
    return band === 'full' || band === 'in' ? 'live' : band === 'between' ? 'between' : 'none';
  }

  protected valueOf({ band, fromVolts, toVolts }: OutcomeRow): string {
    switch (band) {
      case 'full':
        return $localize`about ${this.volts().toFixed(0)}:volts:`;
      case 'none':
        return $localize`near 0`;
      case 'in':
        return $localize`in`;
      case 'out':
        return $localize`out`;
      case 'between':
        return fromVolts !== undefined && toVolts !== undefined
          ? $localize`${fromVolts.toFixed(0)}:from: to ${toVolts.toFixed(0)}:to:`
          : $localize`between`;
    }
  }

  protected meaningOf({ leaves, stretch, probability }: OutcomeRow): string {
    const percent = Math.round(probability * 100);
    const share = percent < 1 ? $localize`hardly likely` : $localize`${percent}:percent: in 100`;
    const what = stretch
      ? $localize`${stretch[0]}:from: to ${stretch[1]}:to:`
      : leaves.slice(0, SHOWN).join(', ') + (leaves.length > SHOWN ? ' …' : '');
    return what ? `${share} · ${what}` : share;
  }
}

/** Parts named in a row. */
const SHOWN = 2;
