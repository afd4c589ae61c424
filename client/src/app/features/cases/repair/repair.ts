import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  signal,
} from '@angular/core';
import { FormsModule } from '@angular/forms';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { cautionSentences } from '@shared/contract';
import { CaseDesk } from '../case-desk';
import { draft } from '../draft';
import { deviceOf } from '../practice';

/** What was done, which devices were touched, and the parts used. */
@Component({
  selector: 'app-repair',
  imports: [FormsModule, RouterLink],
  templateUrl: './repair.html',
  styleUrl: '../stage.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Repair {
  protected readonly desk = inject(CaseDesk);
  private readonly router = inject(Router);
  private readonly route = inject(ActivatedRoute);

  protected readonly what = draft(this.desk.caseId(), 'repair');
  protected readonly touched = signal<readonly string[]>([]);
  protected readonly partName = draft(this.desk.caseId(), 'part');
  protected readonly partNumber = draft(this.desk.caseId(), 'part number');
  protected readonly quantity = signal(1);
  protected readonly tried = signal(false);
  protected readonly busy = signal(false);
  protected readonly live = cautionSentences('live terminals');

  protected readonly devices = computed(() => {
    const circuit = this.desk.circuit();
    const names = circuit?.parts.map(({ name }) => deviceOf(circuit, name)) ?? [];
    return [...new Set(names)];
  });
  protected readonly missing = computed(
    () => this.what().trim().length < 3 || this.touched().length === 0,
  );

  constructor() {
    effect(() => {
      const device = this.desk.state()?.finding?.device;
      if (device && this.touched().length === 0) this.touched.set([device]);
    });
  }

  protected touch(device: string): void {
    if (device && !this.touched().includes(device)) this.touched.set([...this.touched(), device]);
  }

  protected untouch(device: string): void {
    this.touched.set(this.touched().filter((each) => each !== device));
  }

  protected async record(): Promise<void> {
    this.tried.set(true);
    if (this.missing() || this.busy()) return;
    this.busy.set(true);
    const description = this.partName().trim();
    const number = this.partNumber().trim();
    const kept = await this.desk.add('repair done', {
      what: this.what().trim(),
      devices: [...this.touched()],
      parts: description
        ? [{ description, ...(number ? { number } : {}), quantity: Math.max(1, this.quantity()) }]
        : [],
    });
    this.busy.set(false);
    if (!kept) return;
    for (const field of [this.what, this.partName, this.partNumber]) field.set('');
    await this.router.navigate(['..', 'prove'], { relativeTo: this.route });
  }
}
