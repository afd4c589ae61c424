import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  signal,
} from '@angular/core';
import { FormsModule } from '@angular/forms';
import { ActivatedRoute, Router } from '@angular/router';
import { modesOf, type Fault, type FaultMode } from '@shared/circuit';
import { modeWord } from '@shared/contract';
import { CaseDesk } from '../case-desk';
import { draft } from '../draft';
import { deviceOf } from '../practice';
import { directReading } from './direct-reading';

/** What was found: part, mode, cause and proof. Filled from the engine where it found it; all can be changed. */
@Component({
  selector: 'app-state-finding',
  imports: [FormsModule],
  templateUrl: './state-finding.html',
  styleUrl: '../stage.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StateFinding {
  protected readonly desk = inject(CaseDesk);
  private readonly router = inject(Router);
  private readonly route = inject(ActivatedRoute);

  protected readonly part = signal('');
  protected readonly mode = signal<FaultMode | ''>('');
  protected readonly cause = draft(this.desk.caseId(), 'cause');
  protected readonly without = draft(this.desk.caseId(), 'without');
  protected readonly tried = signal(false);
  protected readonly busy = signal(false);
  protected readonly modeWord = modeWord;

  private readonly found = computed(() => {
    const step = this.desk.advice()?.step;
    return step?.kind === 'finding' ? step : undefined;
  });
  /** Likeliest first, then the rest of the string. */
  protected readonly parts = computed(() => {
    const suspects = this.desk.advice()?.suspects.flatMap(({ faults }) => faults) ?? [];
    const all = this.desk.circuit()?.parts.map(({ name }) => name) ?? [];
    return [...new Set([...suspects.map(({ part }) => part), ...all])];
  });
  protected readonly modes = computed<readonly FaultMode[]>(() => {
    const part = this.desk.circuit()?.parts.find(({ name }) => name === this.part());
    const suspected = this.desk
      .advice()
      ?.suspects.flatMap(({ faults }) => faults)
      .filter((fault) => fault.part === this.part())
      .map(({ mode }) => mode);
    const own = part ? modesOf(part).map(({ mode }) => mode) : (['earth'] as const);
    return [...new Set([...(suspected ?? []), ...own])];
  });
  protected readonly proof = computed(() => {
    const [circuit, state] = [this.desk.circuit(), this.desk.state()];
    return circuit && state ? directReading(circuit, state, this.part()) : undefined;
  });
  protected readonly missing = computed(
    () =>
      this.part() === '' ||
      this.mode() === '' ||
      this.cause().trim().length < SHORTEST ||
      (!this.proof() && this.without().trim().length < SHORTEST),
  );

  constructor() {
    effect(() => {
      const fault = this.found()?.suspect.faults[0] ?? this.desk.advice()?.suspects[0]?.faults[0];
      if (!fault || this.part() !== '') return;
      this.part.set(fault.part);
      this.mode.set(fault.mode);
    });
  }

  protected choosePart(part: string): void {
    this.part.set(part);
    this.mode.set(this.modes()[0] ?? '');
  }

  protected async state(): Promise<void> {
    this.tried.set(true);
    const [circuit, mode] = [this.desk.circuit(), this.mode()];
    if (!circuit || mode === '' || this.missing() || this.busy()) return;
    this.busy.set(true);
    const proof = this.proof();
    const kept = await this.desk.add('finding stated', {
      faults: [this.fault(mode)],
      device: deviceOf(circuit, this.part()),
      cause: this.cause().trim(),
      proof: proof
        ? { kind: 'measured', reading: proof.id }
        : { kind: 'not possible', why: this.without().trim() },
      believed: this.believed(),
      restsOnOneReading: this.found()?.restsOnOneReading ?? false,
    });
    this.busy.set(false);
    if (!kept) return;
    this.cause.set('');
    this.without.set('');
    await this.router.navigate(['..', 'repair'], { relativeTo: this.route });
  }

  private fault(mode: FaultMode): Fault {
    const known = this.desk
      .advice()
      ?.suspects.flatMap(({ faults }) => faults)
      .find((fault) => fault.part === this.part() && fault.mode === mode);
    return known ?? { part: this.part(), mode };
  }

  private believed(): number | undefined {
    return this.desk
      .advice()
      ?.suspects.find(({ faults }) => faults.some(({ part }) => part === this.part()))?.probability;
  }
}

/** Fewer characters say nothing. */
const SHORTEST = 3;
