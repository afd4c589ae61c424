import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { FormsModule } from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import { restingState } from '@shared/circuit';
import { refusalSentence } from '@shared/contract';
import { DeviceStore } from '../../core/device/device-store';
import { SessionStore } from '../../core/session/session-store';
import { PageHeader } from '../../core/shell/page-header';
import { LiftEdit } from './lift-edit';

/** One lift, as far as this phone knows it: hazards first, then what is open, then the start of a case. */
@Component({
  selector: 'app-lift-page',
  imports: [DatePipe, FormsModule, LiftEdit, PageHeader, RouterLink],
  templateUrl: './lift-page.html',
  styleUrl: './lift-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LiftPage {
  readonly liftId = input.required<string>();

  protected readonly store = inject(DeviceStore);
  private readonly role = inject(SessionStore).role;
  private readonly router = inject(Router);

  protected readonly complaint = signal('');
  protected readonly problem = signal<string | undefined>(undefined);
  protected readonly busy = signal(false);
  protected readonly quick = [
    $localize`Not moving`,
    $localize`Stops between floors`,
    $localize`Fuse blows`,
    $localize`Works sometimes`,
  ];

  protected readonly lift = computed(() => this.store.lift(this.liftId()));
  protected readonly site = computed(() => {
    const lift = this.lift();
    return lift && this.store.site(lift.siteId);
  });
  protected readonly circuit = computed(() => {
    const lift = this.lift();
    return lift && this.store.circuit(lift.circuitId, lift.circuitRevision);
  });
  private readonly cases = computed(() =>
    this.store.cases().filter(({ liftId }) => liftId === this.liftId()),
  );
  protected readonly open = computed(() =>
    this.cases().filter(({ status }) => status === 'open' || status === 'returned'),
  );
  protected readonly past = computed(() =>
    this.cases()
      .filter(({ status }) => status === 'closed' || status === 'accepted')
      .slice(0, PAST_SHOWN),
  );
  protected readonly linksOut = computed(() =>
    this.cases().flatMap(({ id, links }) =>
      links.filter(({ removedAt }) => !removedAt).map((link) => ({ id, link })),
    ),
  );
  /** Left isolated by the last case, with what was left. */
  protected readonly isolated = computed(() => {
    const [last] = this.cases();
    return last?.outcome === 'left isolated' ? last : undefined;
  });
  protected readonly maySeeLabel = computed(() => this.lift() !== undefined);
  protected readonly mayEdit = computed(
    () => this.role() === 'engineer' || this.role() === 'administrator',
  );
  protected readonly mayOpen = computed(() => this.role() !== 'administrator');

  protected async start(): Promise<void> {
    const lift = this.lift();
    const circuit = this.circuit();
    const complaint = this.complaint().trim();
    if (complaint === '') {
      this.problem.set(
        $localize`Say in a few words what is wrong, or touch one of the usual words.`,
      );
      return;
    }
    if (!lift?.circuitId || !lift.circuitRevision || !circuit || this.busy()) return;
    this.busy.set(true);
    const result = await this.store.openCase(
      {
        liftId: lift.id,
        circuitId: lift.circuitId,
        circuitRevision: lift.circuitRevision,
        complaint,
        practice: lift.practiceFaults !== null,
      },
      restingState(circuit),
    );
    this.busy.set(false);
    if (result.kind === 'kept here') {
      await this.router.navigate(['/cases', result.caseId]);
    } else if (result.kind === 'refused') {
      this.problem.set(refusalSentence(result.refusal.code, result.refusal.details));
    } else {
      this.problem.set(
        $localize`This phone could not keep it: ${result.message}:reason:. Nothing is lost; try again.`,
      );
    }
  }
}

/** Past cases shown on the lift's page. */
const PAST_SHOWN = 6;
