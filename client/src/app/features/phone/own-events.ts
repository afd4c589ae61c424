import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { hasSentence, sentenceOf } from '@shared/contract';
import type { OwnEvent } from '../../core/device/device-database';
import { DeviceStore } from '../../core/device/device-store';
import { eventWords } from '../../core/device/event-words';
import { LocalTime } from '../../core/shell/local-time';

/** Events that are only on this phone, case by case. */
@Component({
  selector: 'app-own-events',
  imports: [LocalTime, RouterLink],
  templateUrl: './own-events.html',
  styleUrl: './own-events.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OwnEvents {
  private readonly store = inject(DeviceStore);
  readonly events = input.required<readonly OwnEvent[]>();

  protected readonly cases = computed(() => {
    const ids = [...new Set(this.events().map(({ caseId }) => caseId))];
    return ids.map((caseId) => ({
      caseId,
      name: this.nameOf(caseId),
      events: this.events()
        .filter((own) => own.caseId === caseId)
        .map((own) => ({
          sequence: own.sequence,
          recordedAt: own.event.recordedAt,
          ...eventWords(own.event),
          reason: own.kept === 'refused' ? reasonOf(own) : undefined,
          data: own.kept === 'refused' ? JSON.stringify(own.event, undefined, 2) : undefined,
        })),
    }));
  });

  private nameOf(caseId: string): string {
    const found = this.store.cases().find(({ id }) => id === caseId);
    const lift = found && this.store.lift(found.liftId);
    const site = lift && this.store.site(lift.siteId);
    return lift
      ? [site?.name, lift.name].filter(Boolean).join(', ')
      : $localize`A case not on file`;
  }
}

/** The server's codes are keys of the table, with or without the part before the point. */
function reasonOf({ code = 'rejected', details }: OwnEvent): string {
  const key = [code, `case.${code}`, `sync.${code}`].find(hasSentence);
  return key ? sentenceOf(key, details) : $localize`The server refused it (${code}:code:).`;
}
