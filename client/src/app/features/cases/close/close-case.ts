import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { FormsModule } from '@angular/forms';
import { RouterLink } from '@angular/router';
import {
  closingNeeds,
  outcomes,
  type CaseState,
  type ClosingNeed,
  type OutcomeOfCase,
} from '@shared/cases';
import { sentenceOf } from '@shared/contract';
import { SessionStore } from '../../../core/session/session-store';
import { CaseDesk } from '../case-desk';
import { draft } from '../draft';
import { logbookText } from './logbook-text';

/** Closing: the outcome, what is still missing with the way to it, the text for the logbook. */
@Component({
  selector: 'app-close-case',
  imports: [FormsModule, RouterLink],
  templateUrl: './close-case.html',
  styleUrl: '../stage.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CloseCase {
  protected readonly desk = inject(CaseDesk);

  private readonly sessions = inject(SessionStore);

  protected readonly outcome = signal<OutcomeOfCase>(usualOutcome(this.desk.state()));
  protected readonly remark = draft(this.desk.caseId(), 'remark');
  protected readonly answer = draft(this.desk.caseId(), 'answer');
  protected readonly busy = signal(false);
  protected readonly copied = signal(false);

  protected readonly outcomes = outcomes.map((outcome) => ({
    outcome,
    label: outcomeNames[outcome],
  }));
  protected readonly needs = computed(() => {
    const state = this.desk.state();
    return state
      ? closingNeeds(state, this.outcome()).map((need) => ({
          code: need.code,
          sentence: sentenceOf(`need.${need.code}`, { what: need.what }),
          leads: leads[need.code],
        }))
      : [];
  });
  protected readonly question = computed(
    () => this.desk.state()?.reviews.findLast(({ kind }) => kind === 'returned')?.text,
  );
  protected readonly logbook = computed(() => {
    const [state, lift, site] = [this.desk.state(), this.desk.lift(), this.desk.site()];
    const zone = this.sessions.session()?.organisation.timeZone ?? 'UTC';
    return state && lift ? logbookText(state, `${site?.name ?? ''}, ${lift.name}`, zone) : '';
  });

  protected async close(): Promise<void> {
    if (this.needs().length > 0 || this.busy()) return;
    this.busy.set(true);
    const remark = this.remark().trim();
    const kept = await this.desk.add('case closed', {
      outcome: this.outcome(),
      ...(remark ? { remark } : {}),
    });
    this.busy.set(false);
    if (kept) this.remark.set('');
  }

  protected async reply(): Promise<void> {
    const text = this.answer().trim();
    if (text && (await this.desk.add('note written', { text }))) this.answer.set('');
  }

  protected async copy(): Promise<void> {
    try {
      await navigator.clipboard.writeText(this.logbook());
      this.copied.set(true);
    } catch {
      // The text stands on the screen and can be marked by hand.
      this.copied.set(false);
    }
  }
}

/** What is offered first; the technician decides. */
function usualOutcome(state: CaseState | undefined): OutcomeOfCase {
  if (state?.outcome) return state.outcome;
  if (state && state.dangers.length > 0) return 'left isolated';
  return state?.finding ? 'repaired' : 'running on arrival';
}

const outcomeNames: Readonly<Record<OutcomeOfCase, string>> = {
  repaired: $localize`Repaired`,
  'running on arrival': $localize`Running on arrival, nothing found`,
  'left isolated': $localize`Left isolated, awaiting part or decision`,
  'cause outside the chain': $localize`Cause outside the safety chain`,
  'closed by the client side': $localize`Put right by the client's side`,
  'no access': $localize`No access`,
  'handed to another trade': $localize`Handed to another trade`,
};

/** Which screen supplies what is missing. */
const leads: Readonly<Record<ClosingNeed['code'], string>> = {
  'arrival missing': '../arrive',
  'links out': '../links',
  'found links not entered': '../links',
  'people in the shaft': '../more',
  'things disturbed': '../links',
  'danger unreleased': '../isolate',
  'finding missing': '../finding',
  'repair missing': '../repair',
  'proof missing': '../finding',
  'points not read again': '../prove',
  'devices not proven': '../prove',
  'not returned to service': '../prove',
  'still isolated': '../isolate',
  'isolation not proven': '../isolate',
  'nothing named as left': '../isolate',
};
