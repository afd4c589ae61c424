import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { FormsModule } from '@angular/forms';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { devicesToProve, pointsToReadAgain, readAgain, type PointToReadAgain } from '@shared/cases';
import { cautionSentences } from '@shared/contract';
import { USUAL_METER } from '@shared/diagnosis';
import { ReadingPad, type PadReading } from '../../../ui/reading-pad';
import { CaseDesk } from '../case-desk';

/** After the repair: the same points again, each touched device proven, runs, covers. */
@Component({
  selector: 'app-prove',
  imports: [FormsModule, ReadingPad, RouterLink],
  templateUrl: './prove.html',
  styleUrl: '../stage.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Prove {
  protected readonly desk = inject(CaseDesk);
  private readonly router = inject(Router);
  private readonly route = inject(ActivatedRoute);

  protected readonly text = signal('');
  protected readonly fromPractice = signal(false);
  protected readonly busy = signal(false);
  protected readonly how = signal('');
  protected readonly runs = signal(2);
  protected readonly covers = signal(false);
  protected readonly tried = signal(false);
  protected readonly motion = cautionSentences('people and motion');
  protected readonly door = cautionSentences('landing door');

  protected readonly direct = computed(() => this.desk.circuit()?.stringCurrent === 'direct');
  protected readonly points = computed(() => {
    const state = this.desk.state();
    return state
      ? pointsToReadAgain(state).map((point) => ({ point, done: readAgain(state, point) }))
      : [];
  });
  protected readonly next = computed(() => this.points().find(({ done }) => !done)?.point);
  protected readonly toProve = computed(() => {
    const state = this.desk.state();
    return state ? devicesToProve(state) : [];
  });
  protected readonly conditions = computed(() => {
    const next = this.next();
    return next
      ? Object.entries(next.state)
          .map(([name, value]) => `${name}: ${value}`)
          .join(' · ')
      : '';
  });

  protected valueBefore(point: PointToReadAgain): string {
    const seen = this.desk
      .state()
      ?.seen.findLast(
        ({ observation, stage }) =>
          stage === 'finding' &&
          observation.kind === 'reading' &&
          observation.red === point.red &&
          observation.black === point.black,
      )?.observation;
    return seen?.kind === 'reading' ? seen.volts.toFixed(1) : '';
  }

  protected valueAfter(point: PointToReadAgain): string {
    const seen = this.desk
      .state()
      ?.seen.findLast(
        ({ observation, stage }) =>
          stage === 'after repair' &&
          observation.kind === 'reading' &&
          observation.red === point.red &&
          observation.black === point.black,
      )?.observation;
    return seen?.kind === 'reading' ? seen.volts.toFixed(1) : '';
  }

  protected typed(text: string): void {
    this.text.set(text);
    this.fromPractice.set(false);
  }

  protected async save(point: PointToReadAgain, { volts, entered }: PadReading): Promise<void> {
    if (this.busy()) return;
    this.busy.set(true);
    const kept = await this.desk.add(
      'reading taken',
      {
        red: point.red,
        black: point.black,
        function: point.function,
        volts,
        meter: USUAL_METER,
        place: this.placeOf(point),
        entered: this.fromPractice() ? 'practice' : entered,
      },
      point.state,
    );
    this.busy.set(false);
    if (kept) {
      this.text.set('');
      this.fromPractice.set(false);
    }
  }

  /** Where it was read before. */
  private placeOf(point: PointToReadAgain): string {
    const seen = this.desk
      .state()
      ?.seen.findLast(
        ({ observation }) =>
          observation.kind === 'reading' &&
          observation.red === point.red &&
          observation.black === point.black,
      )?.observation;
    return seen?.kind === 'reading' ? seen.place : this.desk.place();
  }

  protected async readIt(point: PointToReadAgain): Promise<void> {
    await this.desk.add('state changed', {}, point.state);
    const volts = await this.desk.practiceVolts(point.red, point.black, USUAL_METER.ohms);
    this.text.set(volts.toFixed(1));
    this.fromPractice.set(true);
  }

  protected async cannotReach(point: PointToReadAgain): Promise<void> {
    await this.desk.add('could not reach', { what: point.red });
  }

  protected async undo(): Promise<void> {
    const last = this.desk.state()?.undoable.at(-1);
    if (last) await this.desk.add('event withdrawn', { of: last });
  }

  protected async proven(device: string, result: 'stopped' | 'did not stop'): Promise<void> {
    const how = this.how().trim() || $localize`Operated; string and relay watched`;
    if (await this.desk.add('device proven', { device, result, how })) this.how.set('');
    if (result === 'did not stop')
      await this.router.navigate(['..', 'isolate'], { relativeTo: this.route });
  }

  protected async serve(): Promise<void> {
    this.tried.set(true);
    if (this.busy()) return;
    this.busy.set(true);
    const kept = await this.desk.add('returned to service', {
      runs: Math.max(0, Math.round(this.runs())),
      coversOn: this.covers(),
    });
    this.busy.set(false);
    if (kept) await this.router.navigate(['..', 'close'], { relativeTo: this.route });
  }
}
