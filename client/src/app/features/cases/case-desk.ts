import { Injectable, computed, effect, inject, signal, untracked } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import {
  observationsForEngine,
  type CaseRefusal,
  type EventType,
  type PayloadOf,
} from '@shared/cases';
import type { Fault, LiftState, RelayPosition } from '@shared/circuit';
import { refusalSentence } from '@shared/contract';
import { USUAL_METER, type Advice } from '@shared/diagnosis';
import { DeviceStore } from '../../core/device/device-store';
import { EnginePort } from '../../core/engine/engine-port';
import { adviceRequest, placeOf, provenSupply, stageOf } from './advice-request';
import { faultsLeft, operated, operatedPoints } from './practice';

/** One open case as its screens share it: what is known, what the engine says, the way to add to it. */
@Injectable()
export class CaseDesk {
  private readonly store = inject(DeviceStore);
  private readonly engine = inject(EnginePort);
  private readonly snackBar = inject(MatSnackBar);

  readonly caseId = signal('');
  private readonly journal = computed(() => this.store.journal(this.caseId()));
  readonly state = computed(() => this.journal().state());
  readonly entries = computed(() => this.journal().entries());
  readonly lift = computed(() => {
    const state = this.state();
    return state && this.store.lift(state.liftId);
  });
  readonly site = computed(() => {
    const lift = this.lift();
    return lift && this.store.site(lift.siteId);
  });
  readonly circuit = computed(() => {
    const state = this.state();
    return state && this.store.circuit(state.circuitId, state.circuitRevision);
  });
  readonly place = computed(() => {
    const state = this.state();
    return state ? placeOf(state) : '';
  });
  /** The lift state with a value for every condition. */
  readonly liftState = computed<LiftState>(() => this.request()?.state ?? {});
  readonly supply = computed(() => {
    const [circuit, state] = [this.circuit(), this.state()];
    return circuit && state ? provenSupply(circuit, state) : undefined;
  });
  readonly hidden = computed(() => {
    const [circuit, state] = [this.circuit(), this.state()];
    const faults = this.lift()?.practiceFaults;
    return circuit && state && faults ? faultsLeft(circuit, faults, state) : undefined;
  });
  readonly closed = computed(() => {
    const status = this.state()?.status;
    return status === 'closed' || status === 'accepted';
  });

  private readonly request = computed(() => {
    const [circuit, state] = [this.circuit(), this.state()];
    return circuit && state ? adviceRequest(circuit, state) : undefined;
  });
  private readonly requestKey = computed(() => JSON.stringify(this.request()));

  readonly advice = signal<Advice | undefined>(undefined);
  readonly adviceFailed = signal(false);
  readonly thinking = signal(false);
  /** Names of the circuit's relays, by its coils. */
  readonly relays = computed(() =>
    (this.circuit()?.parts ?? []).filter(({ kind }) => kind === 'coil').map(({ name }) => name),
  );
  /** Readings and looks of the stage that the case is in: before or after the repair. */
  readonly observations = computed(() => {
    const state = this.state();
    return state ? observationsForEngine(state, stageOf(state)) : [];
  });
  /** The latest sentence about something that was not taken. */
  readonly problem = signal<string | undefined>(undefined);

  constructor() {
    effect(() => {
      this.requestKey();
      untracked(() => void this.consult());
    });
  }

  /** Asks the engine again; a later question overtakes an earlier answer. */
  async consult(): Promise<void> {
    const [circuit, request, key] = [this.circuit(), this.request(), this.requestKey()];
    if (!circuit || !request) return;
    this.thinking.set(true);
    this.adviceFailed.set(false);
    try {
      const advice = await this.engine.advise(circuit, request);
      if (key === this.requestKey()) this.advice.set(advice);
    } catch {
      if (key === this.requestKey()) this.adviceFailed.set(true);
    } finally {
      if (key === this.requestKey()) this.thinking.set(false);
    }
  }

  /**
   * Adds an event. True: it is kept on this phone. False: {@link problem} says why, and the screen keeps
   * what was typed.
   */
  async add<T extends EventType>(
    type: T,
    payload: PayloadOf<T>,
    state: LiftState = this.liftState(),
  ): Promise<boolean> {
    const result = await this.journal().append(type, payload, state);
    if (result.kind === 'kept here') {
      this.problem.set(undefined);
      return true;
    }
    this.problem.set(
      result.kind === 'refused'
        ? refused(result.refusal)
        : $localize`This phone could not keep it: ${result.message}:reason:. What you typed is still here.`,
    );
    return false;
  }

  /** The same, and says so where nothing else on the screen shows it. At the top: the pad stays free. */
  async addAndSay<T extends EventType>(type: T, payload: PayloadOf<T>): Promise<boolean> {
    const kept = await this.add(type, payload);
    if (kept) {
      this.snackBar.open($localize`Kept here`, undefined, {
        duration: SAID_FOR,
        verticalPosition: 'top',
      });
    }
    return kept;
  }

  /** The event of the advice that is on the screen; kept when it is first shown. */
  async shown(): Promise<void> {
    const [advice, state] = [this.advice(), this.state()];
    if (!advice || !state || state.status !== 'open') return;
    if (state.finding && state.repairs.length === 0) return;
    const { engine, step, suspects, notDescribed, nothingWrong, expectedMinutes } = advice;
    const last = state.advice.at(-1);
    if (last && JSON.stringify(last.step) === JSON.stringify(step)) return;
    await this.add('advice shown', {
      engine,
      step,
      suspects,
      notDescribed,
      nothingWrong,
      expectedMinutes,
    });
  }

  /** Id of the advice that an answer answers. */
  answering(): string | undefined {
    return this.state()?.advice.at(-1)?.id;
  }

  /** Practice only: what the probes show on the lift as it is now. */
  async practiceVolts(red: string, black: string, ohms: number): Promise<number> {
    const { circuit, hidden } = this.practiceLift();
    const reading = await this.engine.practiceReading(circuit, this.liftState(), hidden, {
      red,
      black,
      ohms,
    });
    return circuit.stringCurrent === 'direct' ? reading.dcVolts : reading.acVolts;
  }

  /** Practice only: which relays are in. */
  async practiceRelays(): Promise<Readonly<Record<string, RelayPosition>>> {
    const { circuit, hidden } = this.practiceLift();
    const line = circuit.strings[0]!;
    const probes = { red: line.from, black: line.return, ohms: USUAL_METER.ohms };
    return (await this.engine.practiceReading(circuit, this.liftState(), hidden, probes)).relays;
  }

  /** Practice only: whether the string opens when a device is operated. */
  async practiceOperate(device: string): Promise<boolean> {
    const { circuit, hidden } = this.practiceLift();
    const points = operatedPoints(circuit, device);
    for (const { red, black } of points) {
      const probes = { red, black, ohms: USUAL_METER.ohms };
      const read = async (faults: readonly Fault[]) => {
        const { dcVolts, acVolts } = await this.engine.practiceReading(
          circuit,
          this.liftState(),
          faults,
          probes,
        );
        return Math.abs(circuit.stringCurrent === 'direct' ? dcVolts : acVolts);
      };
      const before = await read(hidden);
      const after = await read(operated(circuit, hidden, device));
      if (before > circuit.nominalVolts / 2 && after < circuit.nominalVolts / 2) return true;
    }
    return false;
  }

  private practiceLift() {
    const [circuit, hidden] = [this.circuit(), this.hidden()];
    if (!circuit || !hidden) throw new Error('not a practice lift');
    return { circuit, hidden };
  }
}

const refused = ({ code, details }: CaseRefusal): string => refusalSentence(code, details);

/** How long *kept here* stands on the screen, milliseconds. */
const SAID_FOR = 2_000;
