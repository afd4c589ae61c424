import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { FormsModule } from '@angular/forms';
import { RouterLink } from '@angular/router';
import { CaseDesk } from '../case-desk';
import { draft } from '../draft';

type Step = 'supplies' | 'locked' | 'proven before' | 'dead' | 'proven after' | 'notice';

/** Isolating in the order of the trade; what is left undone is recorded as not done. */
@Component({
  selector: 'app-isolate',
  imports: [FormsModule, RouterLink],
  templateUrl: './isolate.html',
  styleUrl: '../stage.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Isolate {
  protected readonly desk = inject(CaseDesk);

  protected readonly done = signal<ReadonlySet<Step>>(new Set());
  protected readonly told = draft(this.desk.caseId(), 'told');
  protected readonly left = draft(this.desk.caseId(), 'left');
  protected readonly busy = signal(false);
  protected readonly steps = steps;

  /** Prove, test, prove again: without all of it nothing is proven dead. */
  protected readonly provenDead = computed(() =>
    PROVEN_DEAD.every((step) => this.done().has(step)),
  );

  protected toggle(step: Step): void {
    const done = new Set(this.done());
    if (!done.delete(step)) done.add(step);
    this.done.set(done);
  }

  protected async isolate(): Promise<void> {
    if (this.busy()) return;
    this.busy.set(true);
    const told = this.told().trim();
    const kept = await this.desk.add('isolated', {
      provenDead: this.provenDead(),
      noticeFitted: this.done().has('notice'),
      ...(told ? { told } : {}),
      left: this.left()
        .split('\n')
        .map((line) => line.trim())
        .filter(Boolean),
    });
    this.busy.set(false);
    if (!kept) return;
    this.told.set('');
    this.left.set('');
    this.done.set(new Set());
  }

  protected async energise(): Promise<void> {
    await this.desk.add('re-energised', {});
  }
}

const PROVEN_DEAD: readonly Step[] = ['locked', 'proven before', 'dead', 'proven after'];

const steps: readonly { readonly step: Step; readonly words: string }[] = [
  { step: 'supplies', words: $localize`Every supply known: main, car light, alarm, neighbour` },
  { step: 'locked', words: $localize`Off, locked with my own lock, key in my pocket` },
  { step: 'proven before', words: $localize`Tester proven on a known source` },
  { step: 'dead', words: $localize`Every conductor to every other and to earth: dead` },
  { step: 'proven after', words: $localize`Tester proven again` },
  { step: 'notice', words: $localize`Notice fitted, people kept away` },
];
