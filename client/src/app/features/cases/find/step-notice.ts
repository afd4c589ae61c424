import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { CaseState } from '@shared/cases';
import type { Circuit } from '@shared/circuit';
import { faultSentence } from '@shared/contract';
import type { Step } from '@shared/diagnosis';
import { inHundred } from '../sure-words';

type FoundStep = Extract<Step, { kind: 'finding' }>;

/** What the engine says instead of a next reading, each with the next thing to do. */
@Component({
  selector: 'app-step-notice',
  imports: [RouterLink],
  templateUrl: './step-notice.html',
  styles: `
    h2 {
      overflow-wrap: anywhere;
      font-size: var(--text-19);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StepNotice {
  readonly step = input.required<Step>();
  readonly circuit = input.required<Circuit>();
  readonly state = input.required<CaseState>();

  protected readonly faultSentence = faultSentence;
  protected readonly inHundred = inHundred;
  protected readonly repaired = computed(() => this.state().repairs.length > 0);
  protected readonly found = computed((): FoundStep | undefined => {
    const step = this.step();
    return step.kind === 'finding' ? step : undefined;
  });
  /** The doubtful entries in words; their ids say nothing to a person. */
  protected readonly doubtful = computed(() => {
    const step = this.step();
    if (step.kind !== 'contradiction') return [];
    return this.state().seen.flatMap(({ observation }) => {
      if (!step.doubtful.includes(observation.id)) return [];
      switch (observation.kind) {
        case 'reading': {
          const { red, black, volts } = observation;
          return $localize`${red}:red: to ${black}:black:: ${volts.toFixed(1)}:volts: V`;
        }
        case 'relay':
          return $localize`relay ${observation.relay}:relay:: ${observation.position}:position:`;
        case 'device':
          return $localize`${observation.part}:part: seen ${observation.seen}:seen:`;
      }
    });
  });
}
