import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
} from '@angular/core';
import { FormsModule } from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import { devicesToProve, weaknessesOf } from '@shared/cases';
import {
  dangerSentence,
  faultSentence,
  refusalSentence,
  routes,
  sentenceOf,
  type CaseDetail,
} from '@shared/contract';
import { DeviceStore } from '../../core/device/device-store';
import { Api } from '../../core/session/api';
import { ApiError } from '../../core/session/api-error';
import { PageHeader } from '../../core/shell/page-header';
import { LampSign } from '../../ui/lamp';
import { lampLine } from '../../ui/line-model';
import { LineOfLamps } from '../../ui/line-of-lamps';
import { BeliefChart } from './belief-chart';
import { beliefLines, caseOf, minutesBetween, reviewReadings } from './review-model';

/** One closed case on one page: is it sound from its evidence? Accept, or return with a question. */
@Component({
  selector: 'app-review-page',
  imports: [BeliefChart, DatePipe, FormsModule, LampSign, LineOfLamps, PageHeader, RouterLink],
  templateUrl: './review-page.html',
  styleUrl: './review-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReviewPage {
  readonly caseId = input.required<string>();

  protected readonly store = inject(DeviceStore);
  private readonly api = inject(Api);
  private readonly router = inject(Router);

  private readonly detail = signal<CaseDetail | undefined>(undefined);
  protected readonly failure = signal<ApiError | undefined>(undefined);
  protected readonly asking = signal(false);
  protected readonly text = signal('');
  protected readonly problem = signal<string | undefined>(undefined);
  protected readonly busy = signal(false);

  private readonly journal = computed(() => this.store.journal(this.caseId()));
  /** From this phone where it holds the case, else as the server gave it. */
  protected readonly state = computed(
    () => this.journal().state() ?? caseOf(this.detail()?.events ?? []),
  );
  protected readonly lift = computed(() => this.store.lift(this.state()?.liftId ?? ''));
  protected readonly site = computed(() => this.store.site(this.lift()?.siteId ?? ''));
  protected readonly circuit = computed(() => {
    const state = this.state();
    return state && this.store.circuit(state.circuitId, state.circuitRevision);
  });
  protected readonly heading = computed(() => {
    const [lift, site] = [this.lift(), this.site()];
    return lift ? `${site ? `${site.name}, ` : ''}${lift.name}` : $localize`A case`;
  });
  protected readonly line = computed(() => {
    const [state, circuit] = [this.state(), this.circuit()];
    return state && circuit
      ? lampLine({
          circuit,
          observations: state.seen
            .filter(({ stage }) => stage === 'finding')
            .map(({ observation }) => observation),
          state: state.state,
        })
      : undefined;
  });
  protected readonly readings = computed(() => {
    const [state, circuit] = [this.state(), this.circuit()];
    return state && circuit ? reviewReadings(state, circuit) : [];
  });
  protected readonly belief = computed(() => {
    const state = this.state();
    return state ? beliefLines(state) : [];
  });
  protected readonly weaknesses = computed(() => {
    const state = this.state();
    return state
      ? weaknessesOf(state).map(({ code, weight, details }) => ({
          grave: weight === 'grave',
          sentence: sentenceOf(`weakness.${code}`, details),
        }))
      : [];
  });
  protected readonly counts = computed(() => {
    const state = this.state();
    if (!state) return undefined;
    const proven = state.proven.filter(({ result }) => result === 'stopped').length;
    return {
      proven,
      toProve: proven + devicesToProve(state).length,
      linksOut: state.links.filter(({ removedAt }) => !removedAt).length,
      runs: state.service?.runs ?? 0,
      readings: this.readings().filter(({ stage }) => stage === 'finding').length,
      toFinding: minutesBetween(state.arrival?.at, state.finding?.at),
      onSite: minutesBetween(state.openedAt, state.closedAt),
    };
  });
  protected readonly mayDecide = computed(() => this.state()?.status === 'closed');
  protected readonly dangerSentence = dangerSentence;
  protected readonly faultSentence = faultSentence;

  constructor() {
    effect(() => {
      const caseId = this.caseId();
      if (this.store.status() === 'ready' && !this.journal().state()) void this.fetch(caseId);
    });
  }

  protected async fetch(caseId = this.caseId()): Promise<void> {
    this.failure.set(undefined);
    try {
      this.detail.set(await this.api.call(routes.case, { params: { id: caseId } }));
    } catch (error) {
      if (!(error instanceof ApiError)) throw error;
      this.failure.set(error);
    }
  }

  protected async accept(): Promise<void> {
    const remark = this.text().trim();
    await this.decide('review accepted', remark ? { remark } : {});
  }

  protected async ask(): Promise<void> {
    const question = this.text().trim();
    if (question === '') {
      this.problem.set($localize`Write the question first.`);
      return;
    }
    await this.decide('review returned', { question });
  }

  private async decide(
    type: 'review accepted' | 'review returned',
    payload: { remark?: string } & { question?: string },
  ): Promise<void> {
    if (this.busy()) return;
    this.busy.set(true);
    const result =
      type === 'review accepted'
        ? await this.journal().append(type, payload)
        : await this.journal().append(type, { question: payload.question ?? '' });
    this.busy.set(false);
    if (result.kind === 'kept here') {
      await this.router.navigateByUrl('/review');
    } else {
      this.problem.set(
        result.kind === 'refused'
          ? refusalSentence(result.refusal.code, result.refusal.details)
          : $localize`This phone could not keep it: ${result.message}:reason:. What you wrote is still here.`,
      );
    }
  }
}
