import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { FormsModule } from '@angular/forms';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { devicesToProve, type PointToReadAgain } from '@shared/cases';
import { cautionSentences } from '@shared/contract';
import { USUAL_METER } from '@shared/diagnosis';
import { ReadingPad, type PadReading } from '../../../ui/reading-pad';
import { CaseDesk } from '../case-desk';
import { undoneNext } from '../case-undo';
import { draft } from '../draft';
import { pointRows, type PointRow } from './prove-model';
import { ProveDevice, type DeviceResult } from './prove-device';

/** After the repair: the same points again, each touched device proven, runs, covers. */
@Component({
  selector: 'app-prove',
  imports: [FormsModule, ProveDevice, ReadingPad, RouterLink],
  templateUrl: './prove.html',
  styleUrl: '../stage.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Prove {
  protected readonly desk = inject(CaseDesk);
  private readonly router = inject(Router);
  private readonly route = inject(ActivatedRoute);

  protected readonly text = draft(this.desk.caseId(), 'reading again');
  protected readonly fromPractice = signal(false);
  protected readonly busy = signal(false);
  protected readonly runs = signal(USUAL_RUNS);
  protected readonly covers = signal(false);
  protected readonly tried = signal(false);
  protected readonly motion = cautionSentences('people and motion');
  protected readonly door = cautionSentences('landing door');

  protected readonly direct = computed(() => this.desk.circuit()?.stringCurrent === 'direct');
  protected readonly points = computed(() => {
    const [circuit, state] = [this.desk.circuit(), this.desk.state()];
    return circuit && state ? pointRows(circuit, state) : [];
  });
  protected readonly next = computed(() => this.points().find(({ done }) => !done)?.point);
  protected readonly unsound = computed(() => this.points().some(({ unsound }) => unsound));
  protected readonly toProve = computed(() => {
    const state = this.desk.state();
    return state ? devicesToProve(state) : [];
  });
  protected readonly undone = computed(() => {
    const state = this.desk.state();
    return state && undoneNext(state);
  });
  protected readonly conditions = computed(() =>
    Object.entries(this.next()?.state ?? {})
      .map(([name, value]) => `${name}: ${value}`)
      .join(' · '),
  );

  protected typed(text: string): void {
    this.text.set(text);
    this.fromPractice.set(false);
  }

  protected async save({ point, before }: PointRow, reading: PadReading): Promise<void> {
    if (this.busy()) return;
    this.busy.set(true);
    const kept = await this.desk.add(
      'reading taken',
      {
        red: point.red,
        black: point.black,
        function: point.function,
        volts: reading.volts,
        meter: USUAL_METER,
        place: before?.place ?? this.desk.place(),
        entered: this.fromPractice() ? 'practice' : reading.entered,
      },
      point.state,
    );
    this.busy.set(false);
    if (!kept) return;
    this.text.set('');
    this.fromPractice.set(false);
  }

  protected async readIt({ red, black, state }: PointToReadAgain): Promise<void> {
    await this.desk.add('state changed', {}, state);
    const volts = await this.desk.practiceVolts(red, black, USUAL_METER.ohms);
    this.text.set(volts.toFixed(1));
    this.fromPractice.set(true);
  }

  protected async cannotReach(point: PointToReadAgain): Promise<void> {
    await this.desk.add('could not reach', { what: point.red });
  }

  protected async undo(): Promise<void> {
    const of = this.undone();
    if (of) await this.desk.add('event withdrawn', { of });
  }

  protected async proven(device: string, { result, how }: DeviceResult): Promise<void> {
    const kept = await this.desk.add('device proven', { device, result, how });
    if (kept && result === 'did not stop') {
      await this.router.navigate(['..', 'isolate'], { relativeTo: this.route });
    }
  }

  protected countRuns(by: number): void {
    this.runs.update((runs) => Math.max(0, Math.min(MOST_RUNS, runs + by)));
  }

  protected async serve(): Promise<void> {
    this.tried.set(true);
    if (this.busy()) return;
    this.busy.set(true);
    const kept = await this.desk.add('returned to service', {
      runs: this.runs(),
      coversOn: this.covers(),
    });
    this.busy.set(false);
    if (kept) await this.router.navigate(['..', 'close'], { relativeTo: this.route });
  }
}

/** One up and one down. */
const USUAL_RUNS = 2;
const MOST_RUNS = 999;
