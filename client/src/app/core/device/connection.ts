import { Injectable, signal } from '@angular/core';
import { fromEvent, map, merge } from 'rxjs';

/** Whether the server can be reached, as far as is known: the browser's word, then what requests found. */
@Injectable({ providedIn: 'root' })
export class Connection {
  private readonly reached = signal(navigator.onLine);
  readonly online = this.reached.asReadonly();

  constructor() {
    merge(
      fromEvent(window, 'online').pipe(map(() => true)),
      fromEvent(window, 'offline').pipe(map(() => false)),
    ).subscribe((online) => this.reached.set(online));
  }

  /** A request was answered, whatever the answer. */
  answered(): void {
    this.reached.set(true);
  }

  /** A request got no answer. */
  unanswered(): void {
    this.reached.set(false);
  }
}
