import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { FormsModule } from '@angular/forms';
import { RouterLink } from '@angular/router';
import { disturbances } from '@shared/cases';
import { NEW_ID } from '../../../core/device/ids';
import { CaseDesk } from '../case-desk';
import { draft } from '../draft';

/** The register: temporary links fitted and removed, and everything else that was disturbed. */
@Component({
  selector: 'app-links',
  imports: [FormsModule, RouterLink],
  templateUrl: './links.html',
  styleUrl: '../stage.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Links {
  protected readonly desk = inject(CaseDesk);
  private readonly newId = inject(NEW_ID);

  protected readonly mark = draft(this.desk.caseId(), 'link mark');
  protected readonly from = signal('');
  protected readonly to = signal('');
  protected readonly reason = draft(this.desk.caseId(), 'link reason');
  protected readonly found = signal(false);
  protected readonly tried = signal(false);
  protected readonly thing = draft(this.desk.caseId(), 'thing');
  protected readonly kind = signal<(typeof disturbances)[number]>('lifted lead');
  protected readonly kinds = disturbances.map((kind) => ({ kind, label: kindNames[kind] }));

  protected readonly tags = computed(
    () => this.desk.circuit()?.terminals.map(({ tag }) => tag) ?? [],
  );
  protected readonly links = computed(() => this.desk.state()?.links ?? []);
  protected readonly things = computed(() => this.desk.state()?.disturbed ?? []);
  protected readonly expected = computed(() => {
    const entered = this.links().filter(({ found }) => found).length;
    return Math.max(0, (this.desk.state()?.arrival?.linksFound ?? 0) - entered);
  });
  protected readonly missing = computed(
    () => !this.mark().trim() || !this.from().trim() || !this.to().trim() || !this.reason().trim(),
  );

  protected async enter(): Promise<void> {
    this.tried.set(true);
    if (this.missing()) return;
    const kept = await this.desk.addAndSay('link fitted', {
      link: this.newId(),
      mark: this.mark().trim(),
      from: this.from().trim(),
      to: this.to().trim(),
      reason: this.reason().trim(),
      found: this.found() || this.expected() > 0,
    });
    if (!kept) return;
    for (const field of [this.mark, this.from, this.to, this.reason]) field.set('');
    this.tried.set(false);
  }

  protected async remove(link: string): Promise<void> {
    await this.desk.addAndSay('link removed', { link });
  }

  protected async disturb(): Promise<void> {
    const what = this.thing().trim();
    if (!what) return;
    const kept = await this.desk.addAndSay('thing disturbed', {
      thing: this.newId(),
      kind: this.kind(),
      what,
    });
    if (kept) this.thing.set('');
  }

  protected async restore(thing: string): Promise<void> {
    await this.desk.addAndSay('thing restored', { thing });
  }

  protected kindName(kind: (typeof disturbances)[number]): string {
    return kindNames[kind];
  }
}

const kindNames: Readonly<Record<(typeof disturbances)[number], string>> = {
  'lifted lead': $localize`Lifted lead`,
  'earth link': $localize`Earth link`,
  'unplugged coil': $localize`Unplugged coil`,
  setting: $localize`Setting`,
  cover: $localize`Cover`,
  'paper between contacts': $localize`Paper between contacts`,
};
