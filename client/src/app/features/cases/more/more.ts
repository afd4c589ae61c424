import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { FormsModule } from '@angular/forms';
import { RouterLink } from '@angular/router';
import { refusalSentence } from '@shared/contract';
import { CaseDesk } from '../case-desk';
import { draft } from '../draft';
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

  protected readonly note = draft(this.desk.caseId(), 'note');

  protected readonly eventWord = eventWord;
  protected readonly refusalSentence = refusalSentence;
  protected readonly entries = computed(() => [...this.desk.entries()].reverse());

  protected async write(): Promise<void> {
    const text = this.note().trim();
    if (text && (await this.desk.addAndSay('note written', { text }))) this.note.set('');
  }
}
