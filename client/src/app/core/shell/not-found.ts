import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink } from '@angular/router';
import { PageHeader } from './page-header';

@Component({
  selector: 'app-not-found',
  imports: [PageHeader, RouterLink],
  template: `
    <app-page-header i18n-heading heading="Not here" />
    <div class="page">
      <div class="notice next">
        <p i18n>There is no page at this address, or it is not yours to see.</p>
        <a class="action" routerLink="/" i18n>To the start</a>
      </div>
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotFound {}
