import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import { FormsModule } from '@angular/forms';
import type { Circuit } from '@shared/circuit';

/** A device looked at: its part, and whether it stands open or shut. */
export interface DeviceSight {
  readonly part: string;
  readonly seen: 'open' | 'shut';
}

/** A look at a contact or switch, by eye. Never proof of its contact. */
@Component({
  selector: 'app-device-seen',
  imports: [FormsModule],
  template: `
    <div class="field">
      <label for="device-seen" i18n>I see a device standing open or shut</label>
      <select id="device-seen" [ngModel]="part()" (ngModelChange)="part.set($event)">
        <option value="" i18n>Choose</option>
        @for (name of devices(); track name) {
          <option [value]="name">{{ name }}</option>
        }
      </select>
    </div>
    <div class="choice">
      <button type="button" class="action" [disabled]="!part()" (click)="say('open')" i18n>
        It stands open
      </button>
      <button type="button" class="action" [disabled]="!part()" (click)="say('shut')" i18n>
        It stands shut
      </button>
    </div>
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
    }
    .choice {
      display: grid;
      grid-template-columns: 1fr 1fr;
      gap: 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DeviceSeen {
  readonly circuit = input.required<Circuit>();
  readonly seen = output<DeviceSight>();

  protected readonly part = signal('');
  protected readonly devices = computed(() =>
    this.circuit()
      .parts.filter(({ kind }) => kind === 'contact')
      .map(({ name }) => name),
  );

  protected say(seen: DeviceSight['seen']): void {
    this.seen.emit({ part: this.part(), seen });
    this.part.set('');
  }
}
