import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { RouterLink } from '@angular/router';
import { Connection } from '../device/connection';
import { DeviceStore } from '../device/device-store';
import { Sync } from '../device/sync';

/** How many events are on this phone only; leads to *this phone*. */
@Component({
  selector: 'app-kept-chip',
  imports: [RouterLink],
  template: `
    <a routerLink="/phone" class="chip" [class.refused]="refused() > 0">
      @if (refused() > 0) {
        <span i18n>{refused(), plural, =1 {1 refused} other {{{ refused() }} refused}}</span>
      } @else if (waiting() > 0) {
        <span i18n>{{ waiting() }} kept here</span>
      } @else if (online()) {
        <span i18n>all sent</span>
      } @else {
        <span i18n>no signal</span>
      }
    </a>
  `,
  styles: `
    .chip {
      display: inline-flex;
      align-items: center;
      min-height: var(--touch);
      padding: 4px 12px;
      border-radius: var(--corner);
      background: var(--raised);
      color: var(--ink);
      font-size: var(--text-13);
      text-decoration: none;
      white-space: nowrap;
      font-variant-numeric: tabular-nums;
    }
    .refused {
      outline: 2px solid var(--ink);
      outline-offset: -2px;
      font-weight: 600;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class KeptChip {
  protected readonly waiting = inject(Sync).waiting;
  protected readonly online = inject(Connection).online;
  private readonly store = inject(DeviceStore);
  protected readonly refused = computed(() => this.store.refused().length);
}
