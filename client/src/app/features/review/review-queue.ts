import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { routes, sentenceOf, type QueueEntry, type Weakness } from '@shared/contract';
import { DeviceStore } from '../../core/device/device-store';
import { Api } from '../../core/session/api';
import { ApiError } from '../../core/session/api-error';
import { PageHeader } from '../../core/shell/page-header';

/** Closed cases that wait: those with most risk first. */
@Component({
  selector: 'app-review-queue',
  imports: [DatePipe, PageHeader, RouterLink],
  templateUrl: './review-queue.html',
  styleUrl: './review-queue.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReviewQueue {
  private readonly api = inject(Api);
  private readonly store = inject(DeviceStore);

  private readonly fetched = signal<readonly QueueEntry[] | undefined>(undefined);
  protected readonly failure = signal<ApiError | undefined>(undefined);
  /** Without those that this phone has decided already and not sent yet. */
  protected readonly queue = computed(() => {
    const decided = new Set(
      this.store
        .cases()
        .filter(({ status }) => status === 'accepted' || status === 'returned')
        .map(({ id }) => id),
    );
    return this.fetched()?.filter(({ id }) => !decided.has(id));
  });

  constructor() {
    void this.fetch();
  }

  protected async fetch(): Promise<void> {
    this.failure.set(undefined);
    try {
      this.fetched.set((await this.api.call(routes.reviewQueue)).cases);
    } catch (error) {
      if (!(error instanceof ApiError)) throw error;
      this.failure.set(error);
    }
  }

  protected sentence({ code, details }: Weakness): string {
    return sentenceOf(`weakness.${code}`, details);
  }

  protected worst({ weaknesses }: QueueEntry): readonly Weakness[] {
    return weaknesses.slice(0, 2);
  }
}
