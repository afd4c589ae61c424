import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { KeptChip } from './kept-chip';

/** Top of a page: the way back, what this is, what is not sent yet; actions go into its content. */
@Component({
  selector: 'app-page-header',
  imports: [KeptChip, RouterLink],
  template: `
    <header>
      @if (back(); as address) {
        <a class="back" [routerLink]="address" i18n-aria-label aria-label="Back">
          <svg viewBox="0 0 24 24" aria-hidden="true"><path d="M15 5l-7 7 7 7" /></svg>
        </a>
      }
      <div class="words">
        <h1>{{ heading() }}</h1>
        @if (under(); as words) {
          <p>{{ words }}</p>
        }
      </div>
      <ng-content />
      <app-kept-chip />
    </header>
  `,
  styles: `
    header {
      display: flex;
      align-items: center;
      gap: 12px;
      min-height: 64px;
      padding: 8px 16px;
      border-bottom: 1px solid var(--rule);
      background: var(--panel);
    }
    .back {
      display: grid;
      flex: none;
      place-items: center;
      width: var(--touch);
      height: var(--touch);
      margin: 0 -4px 0 -12px;
      color: var(--ink);
    }
    .back svg {
      width: 26px;
      fill: none;
      stroke: currentcolor;
      stroke-width: 2.2;
    }
    .words {
      flex: 1;
      min-width: 0;
    }
    h1 {
      overflow: hidden;
      font-size: var(--text-19);
      text-overflow: ellipsis;
      white-space: nowrap;
    }
    p {
      overflow: hidden;
      color: var(--soft);
      font-size: var(--text-13);
      text-overflow: ellipsis;
      white-space: nowrap;
    }
    @media (min-width: 1000px) {
      header {
        min-height: 72px;
        padding: 8px 32px;
      }
      .back {
        margin-left: -16px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PageHeader {
  readonly heading = input.required<string>();
  readonly under = input<string>();
  readonly back = input<string>();
}
