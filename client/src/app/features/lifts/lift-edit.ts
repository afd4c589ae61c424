import { ChangeDetectionStrategy, Component, effect, inject, input, signal } from '@angular/core';
import { FormsModule } from '@angular/forms';
import { liftSchema, routes, type Lift } from '@shared/contract';
import { NEW_ID } from '../../core/device/ids';
import { Sync } from '../../core/device/sync';
import { Api } from '../../core/session/api';
import { ApiError } from '../../core/session/api-error';

/** Notes and hazards; a change that someone else made meanwhile is shown beside one's own. */
@Component({
  selector: 'app-lift-edit',
  imports: [FormsModule],
  template: `
    <details>
      <summary class="action wide" i18n>Change notes and hazards</summary>
      <div class="form">
        <div class="field">
          <label for="hazards" i18n>Hazards, one a line</label>
          <textarea
            id="hazards"
            [ngModel]="hazards()"
            (ngModelChange)="hazards.set($event)"
          ></textarea>
        </div>
        <div class="field">
          <label for="notes" i18n>Notes</label>
          <textarea
            id="notes"
            maxlength="4000"
            [ngModel]="notes()"
            (ngModelChange)="notes.set($event)"
          ></textarea>
        </div>
        @if (theirs(); as other) {
          <div class="notice next" role="alert">
            <h3 i18n>Someone else changed this lift meanwhile</h3>
            <p><strong i18n>Their hazards</strong> {{ other.hazards.join(' · ') }}</p>
            <p><strong i18n>Their notes</strong> {{ other.notes }}</p>
            <p class="small" i18n>
              Yours stand above. Take over what is right, then save: it becomes the newest.
            </p>
          </div>
        }
        @if (problem(); as sentence) {
          <p class="notice" role="alert">{{ sentence }}</p>
        }
        <button
          type="button"
          class="action saves"
          [attr.aria-disabled]="busy()"
          (click)="save()"
          i18n
        >
          Save
        </button>
        @if (saved()) {
          <p role="status" i18n>Saved.</p>
        }
      </div>
    </details>
  `,
  styles: `
    .form {
      display: grid;
      gap: 12px;
      padding-top: 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LiftEdit {
  readonly lift = input.required<Lift>();

  private readonly api = inject(Api);
  private readonly sync = inject(Sync);
  private readonly newId = inject(NEW_ID);

  protected readonly hazards = signal('');
  protected readonly notes = signal('');
  protected readonly theirs = signal<Lift | undefined>(undefined);
  protected readonly problem = signal<string | undefined>(undefined);
  protected readonly busy = signal(false);
  protected readonly saved = signal(false);
  private version = 0;

  constructor() {
    effect(() => {
      const lift = this.lift();
      // Only the first one: a fresh pack must not take away what is being typed.
      if (this.version === 0) this.take(lift);
    });
  }

  private take({ hazards, notes, version }: Lift): void {
    this.hazards.set(hazards.join('\n'));
    this.notes.set(notes);
    this.version = version;
  }

  protected async save(): Promise<void> {
    if (this.busy()) return;
    this.busy.set(true);
    this.saved.set(false);
    this.problem.set(undefined);
    try {
      const lift = await this.api.call(routes.changeLift, {
        params: { id: this.lift().id },
        body: {
          notes: this.notes().trim(),
          hazards: this.hazards()
            .split('\n')
            .map((line) => line.trim())
            .filter(Boolean),
        },
        version: this.version,
        key: this.newId(),
      });
      this.version = lift.version;
      this.theirs.set(undefined);
      this.saved.set(true);
      await this.sync.refreshNow();
    } catch (error) {
      this.failed(error);
    } finally {
      this.busy.set(false);
    }
  }

  private failed(error: unknown): void {
    if (!(error instanceof ApiError)) throw error;
    const current = liftSchema.safeParse(error.details['current']);
    if (error.code === 'version_conflict' && current.success) {
      this.theirs.set(current.data);
      this.version = current.data.version;
    } else {
      this.problem.set(error.detail);
    }
  }
}
