import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { FormsModule } from '@angular/forms';
import type { PayloadOf } from '@shared/cases';
import { CaseDesk } from '../case-desk';
import { draft } from '../draft';
import { deviceOf, operatedPoints } from '../practice';

export type DeviceResult = Pick<PayloadOf<'device proven'>, 'result' | 'how'>;

/** Proving one device by operating it: the string opens and its relay drops, or it is dangerous. */
@Component({
  selector: 'app-prove-device',
  imports: [FormsModule],
  templateUrl: './prove-device.html',
  styleUrl: '../stage.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProveDevice {
  readonly device = input.required<string>();
  readonly proven = output<DeviceResult>();

  protected readonly desk = inject(CaseDesk);
  protected readonly how = draft(this.desk.caseId(), 'how it was proven');
  protected readonly tried = signal(false);
  protected readonly observed = signal<string | undefined>(undefined);

  /** How the drawing says it is looked at. */
  protected readonly inspection = computed(() => {
    const circuit = this.desk.circuit();
    return circuit?.parts.find(
      ({ name, inspection }) => inspection && deviceOf(circuit, name) === this.device(),
    )?.inspection;
  });

  /** A practice lift, and a device with a contact that opens. */
  protected readonly operable = computed(() => {
    const circuit = this.desk.circuit();
    return circuit && this.desk.hidden() && operatedPoints(circuit, this.device()).length > 0;
  });

  protected async operateInPractice(): Promise<void> {
    const stopped = await this.desk.practiceOperate(this.device());
    this.observed.set(
      stopped
        ? $localize`Practice: operated, the string opened.`
        : $localize`Practice: operated, the string stayed live.`,
    );
  }

  protected say(result: DeviceResult['result']): void {
    this.tried.set(true);
    const how = this.how().trim() || this.observed() || '';
    if (result === 'not possible' && !how) return;
    this.how.set('');
    this.proven.emit({ result, how: how || $localize`Operated by hand; string and relay watched` });
  }
}
