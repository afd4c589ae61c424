import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { faultSentence } from '@shared/contract';
import type { Advice } from '@shared/diagnosis';
import { inHundred } from '../sure-words';

/** Suspects with how sure the readings make them, likeliest first. */
@Component({
  selector: 'app-suspect-list',
  template: `
    <ol>
      @for (row of rows(); track $index) {
        <li>
          <span class="name">{{ row.name }}</span>
          <span class="figures">{{ row.percent }}</span>
          <span class="bar" aria-hidden="true"><span [style.width.%]="row.width"></span></span>
          @if (row.also) {
            <span class="also">{{ row.also }}</span>
          }
        </li>
      } @empty {
        <li class="soft" i18n>None yet.</li>
      }
    </ol>
    @if (advice(); as known) {
      <p class="soft small" i18n>
        Nothing wrong now: {{ inHundred(known.nothingWrong) }}. Something this circuit does not
        describe: {{ inHundred(known.notDescribed) }}.
      </p>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
    }
    ol {
      display: grid;
      gap: 10px;
    }
    li {
      display: grid;
      grid-template-columns: minmax(0, 1fr) auto;
      gap: 2px 8px;
    }
    .name {
      font-size: var(--text-13);
    }
    .figures {
      font-weight: 600;
      font-size: var(--text-13);
    }
    .bar {
      grid-column: 1 / 3;
      height: 8px;
      border: 1px solid var(--lamp-text);
      border-radius: 4px;
    }
    .bar span {
      display: block;
      height: 100%;
      background: repeating-linear-gradient(
        135deg,
        var(--lamp-text) 0 1.5px,
        transparent 1.5px 5px
      );
      transition: width 240ms;
    }
    .also {
      grid-column: 1 / 3;
      color: var(--soft);
      font-size: var(--text-12);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SuspectList {
  readonly advice = input<Advice>();
  protected readonly inHundred = inHundred;

  protected readonly rows = computed(() =>
    (this.advice()?.suspects ?? []).slice(0, SHOWN).map(({ faults, probability }) => ({
      name: faultSentence(faults[0]!),
      percent: inHundred(probability),
      width: probability * 100,
      also:
        faults.length > 1
          ? $localize`can't be told apart yet from ${faults.slice(1, 3).map(faultSentence).join('; ')}:others:`
          : '',
    })),
  );
}

const SHOWN = 6;
