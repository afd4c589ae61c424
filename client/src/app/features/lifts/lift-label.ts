import { DOCUMENT } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { create } from 'qrcode';
import { DeviceStore } from '../../core/device/device-store';
import { PageHeader } from '../../core/shell/page-header';

/** Quiet zone around the code, modules (ISO/IEC 18004 asks for four). */
const QUIET = 4;

/** The label for the machine room: the code as QR and in letters that can be read over a telephone. */
@Component({
  selector: 'app-lift-label',
  imports: [PageHeader],
  template: `
    @if (lift(); as lift) {
      <app-page-header
        i18n-heading
        heading="Label"
        [under]="lift.name"
        [back]="'/lifts/' + lift.id"
      >
        <button type="button" class="action" (click)="print()" i18n>Print</button>
      </app-page-header>
      <div class="page">
        <figure>
          @if (code(); as code) {
            <svg
              [attr.viewBox]="code.box"
              role="img"
              i18n-aria-label
              aria-label="QR code of this lift"
            >
              <rect class="paper" [attr.width]="code.side" [attr.height]="code.side" />
              <path [attr.d]="code.path" />
            </svg>
          }
          <figcaption>
            <strong class="figures">{{ lift.label }}</strong>
            <span>{{ site()?.name }}, {{ lift.name }}</span>
          </figcaption>
        </figure>
      </div>
    }
  `,
  styles: `
    figure {
      display: grid;
      gap: 12px;
      justify-items: center;
      width: 300px;
      padding: 20px;
      background: #fff;
      color: #000;
    }
    svg {
      width: 100%;
    }
    .paper {
      fill: #fff;
    }
    path {
      fill: #000;
    }
    figcaption {
      display: grid;
      justify-items: center;
    }
    strong {
      font-size: var(--text-34);
      letter-spacing: 0.08em;
    }
    @media print {
      app-page-header {
        display: none;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LiftLabel {
  readonly liftId = input.required<string>();

  private readonly store = inject(DeviceStore);
  private readonly window = inject(DOCUMENT).defaultView!;

  protected readonly lift = computed(() => this.store.lift(this.liftId()));
  protected readonly site = computed(() => {
    const lift = this.lift();
    return lift && this.store.site(lift.siteId);
  });
  protected readonly code = computed(() => {
    const lift = this.lift();
    if (!lift) return undefined;
    const { modules } = create(`${this.window.location.origin}/l/${lift.label}`, {
      errorCorrectionLevel: 'Q',
    });
    const side = modules.size + 2 * QUIET;
    let path = '';
    for (let row = 0; row < modules.size; row++) {
      for (let column = 0; column < modules.size; column++) {
        if (modules.get(row, column)) path += `M${column + QUIET} ${row + QUIET}h1v1h-1z`;
      }
    }
    return { side, path, box: `0 0 ${side} ${side}` };
  });

  protected print(): void {
    this.window.print();
  }
}
