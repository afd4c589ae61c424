import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { FormsModule } from '@angular/forms';
import { RouterLink } from '@angular/router';
import type { PayloadOf } from '@shared/cases';
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
    const told = this.told().trim();
    const kept = await this.record({
      provenDead: this.provenDead(),
      noticeFitted: this.done().has('notice'),
      ...(told ? { told } : {}),
      left: linesOf(this.left()),
    });
    if (!kept) return;
    this.told.set('');
    this.left.set('');
    this.done.set(new Set());
  }

  /** The isolation stays as it was recorded; more is named as left. */
  protected async addLeft(isolated: PayloadOf<'isolated'>): Promise<void> {
    const more = linesOf(this.left());
    if (more.length === 0) return;
    const { provenDead, noticeFitted, told } = isolated;
    const left = [...new Set([...isolated.left, ...more])];
    const kept = await this.record({ provenDead, noticeFitted, ...(told ? { told } : {}), left });
    if (kept) this.left.set('');
  }

  private async record(isolated: PayloadOf<'isolated'>): Promise<boolean> {
    if (this.busy()) return false;
    this.busy.set(true);
    const kept = await this.desk.add('isolated', isolated);
    this.busy.set(false);
    return kept;
  }

  protected async energise(): Promise<void> {
    await this.desk.add('re-energised', {});
  }
}

const linesOf = (text: string): string[] =>
  text
    .split('\n')
    .map((line) => line.trim())
    .filter(Boolean);

const PROVEN_DEAD: readonly Step[] = ['locked', 'proven before', 'dead', 'proven after'];

const steps: readonly { readonly step: Step; readonly words: string }[] = [
  { step: 'supplies', words: $localize`Every supply known: main, car light, alarm, neighbour` },
  { step: 'locked', words: $localize`Off, locked with my own lock, key in my pocket` },
  { step: 'proven before', words: $localize`Tester proven on a known source` },
  { step: 'dead', words: $localize`Every conductor to every other and to earth: dead` },
  { step: 'proven after', words: $localize`Tester proven again` },
  { step: 'notice', words: $localize`Notice fitted, people kept away` },
];
