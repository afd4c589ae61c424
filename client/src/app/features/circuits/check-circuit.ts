import { ChangeDetectionStrategy, Component, computed, signal } from '@angular/core';
import { FormsModule } from '@angular/forms';
import { checkCircuit, type CheckFinding } from '@shared/circuit';
import { sentenceOf } from '@shared/contract';
import { PageHeader } from '../../core/shell/page-header';

type Checked =
  | { readonly kind: 'empty' }
  | { readonly kind: 'unreadable'; readonly why: string }
  | { readonly kind: 'checked'; readonly name: string; readonly findings: readonly CheckFinding[] };

/** Paste a circuit, see what the check has to say. Works without network: it is the engine's own check. */
@Component({
  selector: 'app-check-circuit',
  imports: [FormsModule, PageHeader],
  template: `
    <app-page-header i18n-heading heading="Check a circuit" />
    <div class="page columns">
      <div class="field">
        <label for="circuit" i18n>Circuit as JSON</label>
        <textarea
          id="circuit"
          rows="22"
          spellcheck="false"
          [ngModel]="text()"
          (ngModelChange)="text.set($event)"
        ></textarea>
      </div>
      <section aria-live="polite">
        @switch (checked().kind) {
          @case ('empty') {
            <p class="soft" i18n>
              Paste a circuit. What is wrong with it stands here, while you type.
            </p>
          }
          @case ('unreadable') {
            <div class="notice">
              <h2 i18n>This can't be read as JSON</h2>
              <p>{{ why() }}</p>
            </div>
          }
          @default {
            @if (name()) {
              <h2>{{ name() }}</h2>
            }
            @if (findings().length === 0) {
              <p i18n>Nothing to say against it.</p>
            }
            <ul>
              @for (finding of findings(); track $index) {
                <li>
                  <strong>
                    @if (finding.severity === 'error') {
                      <ng-container i18n>Error</ng-container>
                    } @else {
                      <ng-container i18n>Warning</ng-container>
                    }
                  </strong>
                  <span>{{ sentence(finding) }}</span>
                  <code class="soft small">{{ finding.at }}</code>
                </li>
              }
            </ul>
          }
        }
      </section>
    </div>
  `,
  styles: `
    textarea {
      min-height: 320px;
      font-family: monospace;
      font-size: var(--text-13);
    }
    section {
      display: grid;
      gap: 12px;
      align-content: start;
    }
    li {
      display: grid;
      gap: 2px;
      padding: 10px 0;
      border-top: 1px solid var(--rule);
    }
    @media (min-width: 1000px) {
      .columns {
        grid-template-columns: 1fr 1fr;
        gap: 32px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CheckCircuit {
  protected readonly text = signal('');
  protected readonly checked = computed(() => check(this.text()));
  protected readonly why = computed(() => {
    const checked = this.checked();
    return checked.kind === 'unreadable' ? checked.why : '';
  });
  protected readonly name = computed(() => {
    const checked = this.checked();
    return checked.kind === 'checked' ? checked.name : '';
  });
  protected readonly findings = computed(() => {
    const checked = this.checked();
    return checked.kind === 'checked' ? checked.findings.slice(0, SHOWN) : [];
  });

  protected sentence({ code, at, details }: CheckFinding): string {
    return sentenceOf(code, { at, ...details });
  }
}

/** More findings than these are one mistake at the beginning. */
const SHOWN = 60;

function check(text: string): Checked {
  if (text.trim() === '') return { kind: 'empty' };
  try {
    const { circuit, findings } = checkCircuit(JSON.parse(text));
    return { kind: 'checked', name: circuit?.name ?? '', findings };
  } catch (error) {
    return { kind: 'unreadable', why: error instanceof Error ? error.message : '' };
  }
}
