import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { Circuit, LiftState } from '@shared/circuit';

/** Where the technician stands and what state the lift is in. */
@Component({
  selector: 'app-surroundings',
  template: `
    <div class="field">
      <label>
        <span i18n>I am at</span>
        <select #place (change)="placeChange.emit(place.value)">
          @for (each of circuit().places; track each.name) {
            <option [value]="each.name" [selected]="each.name === this.place()">
              {{ each.name }}
            </option>
          }
        </select>
      </label>
    </div>
    @for (condition of circuit().conditions; track condition.name) {
      <div class="field">
        <label>
          <span>{{ condition.name }}</span>
          <select #value (change)="set(condition.name, value.value)">
            @for (each of condition.values; track each) {
              <option [value]="each" [selected]="each === state()[condition.name]">
                {{ each }}
              </option>
            }
          </select>
        </label>
      </div>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 10px;
    }
    label {
      display: grid;
      gap: 4px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Surroundings {
  readonly circuit = input.required<Circuit>();
  readonly place = input.required<string>();
  readonly state = input.required<LiftState>();
  readonly placeChange = output<string>();
  readonly stateChange = output<LiftState>();

  protected set(name: string, value: string): void {
    this.stateChange.emit({ ...this.state(), [name]: value });
  }
}
