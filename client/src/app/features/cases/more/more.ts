import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { FormsModule } from '@angular/forms';
import { RouterLink } from '@angular/router';
import { dangerSentence, refusalSentence } from '@shared/contract';
import { CaseDesk } from '../case-desk';
import { eventWord } from './event-word';

/** The rest of a case: links, isolation, notes, and everything that was recorded, with where it is kept. */
@Component({
  selector: 'app-more',
  imports: [DatePipe, FormsModule, RouterLink],
  templateUrl: './more.html',
  styleUrl: '../stage.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class More {
  protected readonly desk = inject(CaseDesk);

  protected readonly note = signal('');
  protected readonly provenDead = signal(false);
  protected readonly noticeFitted = signal(false);
  protected readonly told = signal('');
  protected readonly left = signal('');

  protected readonly dangerSentence = dangerSentence;
  protected readonly eventWord = eventWord;
  protected readonly refusalSentence = refusalSentence;
  protected readonly entries = computed(() => [...this.desk.entries()].reverse());

  protected async write(): Promise<void> {
    const text = this.note().trim();
    if (text && (await this.desk.add('note written', { text }))) this.note.set('');
  }

  protected async isolate(): Promise<void> {
    const told = this.told().trim();
    await this.desk.add('isolated', {
      provenDead: this.provenDead(),
      noticeFitted: this.noticeFitted(),
      ...(told ? { told } : {}),
      left: this.left()
        .split('\n')
        .map((line) => line.trim())
        .filter(Boolean),
    });
  }

  protected async energise(): Promise<void> {
    await this.desk.add('re-energised', {});
  }
}
