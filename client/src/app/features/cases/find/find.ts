import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  signal,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import type { LiftState, RelayPosition } from '@shared/circuit';
import { cautionSentences, reasonSentence } from '@shared/contract';
import { USUAL_METER, type CautionCode } from '@shared/diagnosis';
import { lampLine } from '../../../ui/line-model';
import { LineOfLamps } from '../../../ui/line-of-lamps';
import { ReadingPad, type PadReading } from '../../../ui/reading-pad';
import { RelayLook } from '../../../ui/relay-look';
import { CaseDesk } from '../case-desk';
import { undoneNext } from '../case-undo';
import { draft } from '../draft';
import {
  cautionsDue,
  chosenProbes,
  probesShown,
  readingToRepeat,
  statesToSet,
  suggestionOf,
} from './find-model';
import { DeviceSeen, type DeviceSight } from './device-seen';
import { OutcomeRows } from './outcome-rows';
import { ProbeCards } from './probe-cards';
import { StepNotice } from './step-notice';
import { SuspectList } from './suspect-list';
import { Surroundings } from './surroundings';

/** The next reading: where the probes go, why, what each outcome would mean, and the pad. */
@Component({
  selector: 'app-find',
  imports: [
    DeviceSeen,
    LineOfLamps,
    OutcomeRows,
    ProbeCards,
    ReadingPad,
    RelayLook,
    RouterLink,
    StepNotice,
    Surroundings,
    SuspectList,
  ],
  templateUrl: './find.html',
  styleUrl: './find.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Find {
  protected readonly desk = inject(CaseDesk);
  protected readonly chosen = signal<{ red: string; black: string } | undefined>(undefined);

  protected readonly text = draft(this.desk.caseId(), 'reading');
  protected readonly busy = signal(false);
  protected readonly fromPractice = signal(false);
  /** On a phone the suspects lie over the card; on a desk they stand beside it. */
  protected readonly sheet = signal(false);

  /** People first: before the arrival checks nothing is asked for. */
  protected readonly arrived = computed(() => this.desk.state()?.arrival !== undefined);
  protected readonly advice = this.desk.advice;
  protected readonly step = computed(() => this.advice()?.step);
  protected readonly suggestion = computed(() => suggestionOf(this.advice()));
  protected readonly circuit = computed(() => this.desk.circuit()!);
  protected readonly direct = computed(() => this.circuit().stringCurrent === 'direct');
  protected readonly here = computed(() => ({
    place: this.desk.place(),
    state: this.desk.liftState(),
  }));
  protected readonly probes = computed(() =>
    probesShown(this.advice(), this.chosen(), this.here()),
  );
  protected readonly line = computed(() =>
    lampLine({
      circuit: this.circuit(),
      observations: this.desk.observations(),
      state: this.desk.liftState(),
      advice: this.advice(),
      provenDead: this.desk.state()?.isolated?.provenDead,
    }),
  );
  protected readonly due = computed(() => {
    const state = this.desk.state();
    const suggestion = this.suggestion();
    const probes = this.probes();
    if (!state || !probes) return [];
    const codes = probes.asked ? (suggestion?.cautions ?? []) : OWN_READING;
    return cautionsDue(state, codes, probes.place);
  });
  protected readonly toSet = computed(() => {
    const probes = this.probes();
    return probes ? statesToSet(probes.state, this.desk.liftState()) : [];
  });
  protected readonly why = computed(() => (this.suggestion()?.because ?? []).map(reasonSentence));
  protected readonly undone = computed(() => {
    const state = this.desk.state();
    return state && undoneNext(state);
  });
  /** Range, lift state and minutes, beside the meter's function. */
  protected readonly around = computed(() => {
    const [probes, suggestion] = [this.probes(), this.suggestion()];
    if (!probes) return '';
    const state = Object.entries(probes.state).map(([name, value]) => `${name}: ${value}`);
    const minutes = probes.place === this.desk.place() ? 0 : Math.round(suggestion?.minutes ?? 0);
    return [
      ...state,
      ...(probes.asked && minutes > 0 ? [$localize`about ${minutes}:minutes: min`] : []),
    ]
      .map((words) => `· ${words}`)
      .join(' ');
  });
  /** Without a pad there is room on a phone for what is suspected. */
  protected readonly roomForSuspects = computed(
    () =>
      !this.probes() &&
      this.advice() !== undefined &&
      this.step()?.kind !== 'finding' &&
      this.step()?.kind !== 'stop',
  );
  /** What stands over the card. */
  protected readonly lead = computed(() => {
    const probes = this.probes();
    if (probes) return !probes.asked ? 'own' : probes.place === this.desk.place() ? 'here' : 'away';
    if (this.suggestion()?.kind === 'relay') return 'look';
    return this.advice() || this.desk.adviceFailed() ? 'stands' : 'thinking';
  });
  /** After isolation, the reading that raised the danger, once. */
  protected readonly repeatable = computed(() => {
    const state = this.desk.state();
    return state && !this.chosen() ? readingToRepeat(state) : undefined;
  });

  protected readonly cautionSentences = cautionSentences;

  constructor() {
    effect(() => {
      if (this.advice() && this.arrived()) void this.desk.shown();
    });
    effect(() => {
      const step = this.step();
      if (step?.kind === 'stop') void this.raise(step.dangers);
    });
  }

  private async raise(
    dangers: Extract<NonNullable<ReturnType<Find['step']>>, { kind: 'stop' }>['dangers'],
  ): Promise<void> {
    for (const danger of dangers) {
      const known = this.desk
        .state()
        ?.dangers.some(({ code, part }) => code === danger.code && part === danger.part);
      if (!known) await this.desk.add('danger raised', { danger });
    }
  }

  protected choose(tag: string): void {
    this.chosen.set(chosenProbes(this.circuit(), tag));
  }

  /** Back to what the engine asks for. */
  protected backToSuggestion(): void {
    this.chosen.set(undefined);
  }

  protected swap(): void {
    const probes = this.probes();
    if (probes) this.chosen.set({ red: probes.black, black: probes.red });
  }

  protected async understood(): Promise<void> {
    const place = this.probes()?.place;
    if (place === undefined) return;
    const codes: CautionCode[] = [...this.due()];
    await this.desk.add('caution acknowledged', { codes, place });
  }

  protected async save({ volts, entered }: PadReading): Promise<void> {
    const probes = this.probes();
    if (!probes || this.busy()) return;
    this.busy.set(true);
    const kept = await this.desk.add(
      'reading taken',
      {
        red: probes.red,
        black: probes.black,
        function: this.direct() ? 'dc volts' : 'ac volts',
        volts,
        meter: USUAL_METER,
        place: probes.asked ? probes.place : this.desk.place(),
        entered: this.fromPractice() ? 'practice' : entered,
        ...(probes.asked ? { answers: this.desk.answering() } : {}),
      },
      probes.state,
    );
    this.busy.set(false);
    if (!kept) return;
    this.text.set('');
    this.fromPractice.set(false);
    this.chosen.set(undefined);
  }

  protected async readIt(): Promise<void> {
    const probes = this.probes();
    if (!probes) return;
    if (this.toSet().length > 0) await this.setState(probes.state);
    const volts = await this.desk.practiceVolts(probes.red, probes.black, USUAL_METER.ohms);
    this.text.set(volts.toFixed(1));
    this.fromPractice.set(true);
  }

  protected typed(text: string): void {
    this.text.set(text);
    this.fromPractice.set(false);
  }

  protected async setState(state: LiftState): Promise<void> {
    await this.desk.add('state changed', {}, state);
  }

  /** Soft evidence; volts behind a device that is seen open are a sign of danger. */
  protected async seeDevice(seen: DeviceSight): Promise<void> {
    await this.desk.add('device seen', seen);
    this.sheet.set(false);
  }

  protected async stand(place: string): Promise<void> {
    await this.desk.add('place changed', { place });
  }

  protected async look(relay: string, position: RelayPosition): Promise<void> {
    await this.desk.add('relay seen', { relay, position, answers: this.desk.answering() });
  }

  protected async lookInPractice(relay: string): Promise<void> {
    const position = (await this.desk.practiceRelays())[relay];
    if (position) await this.look(relay, position);
  }

  protected async cannotReach(): Promise<void> {
    const probes = this.probes();
    const suggestion = this.suggestion();
    const line = this.circuit().strings[0]!;
    const ends = probes ? [probes.red, probes.black] : [suggestion?.relay ?? ''];
    // The return is black's home: what can't be reached is the other end.
    const what = ends.find((tag) => tag !== line.return && tag !== line.supplyReturn) ?? ends[0];
    if (what) await this.desk.add('could not reach', { what });
    this.chosen.set(undefined);
  }

  protected async notSure(): Promise<void> {
    const suggestion = this.suggestion();
    if (suggestion?.kind !== 'reading') return;
    const { red, black } = suggestion;
    await this.desk.add('suggestion declined', {
      key: `${red} ${black} ${suggestion.function}`,
      answers: this.desk.answering(),
    });
    this.text.set('');
  }

  protected async undo(): Promise<void> {
    const of = this.undone();
    if (of) await this.desk.add('event withdrawn', { of });
  }
}

/** Cautions before a reading that nobody asked for. */
const OWN_READING: readonly CautionCode[] = ['live terminals', 'may start when cleared'];
