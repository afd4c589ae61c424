import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  effect,
  inject,
  input,
  output,
} from '@angular/core';
import { LampSign } from './lamp';
import type { Lamp, LampLine, LineSection } from './line-model';

/** From supply to return in the order wired; touching a lamp chooses its tag for a reading. */
@Component({
  selector: 'app-line-of-lamps',
  imports: [LampSign],
  templateUrl: './line-of-lamps.html',
  styleUrl: './line-of-lamps.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  // Without buttons in it nothing else lets the keyboard scroll a long line.
  host: { '[attr.tabindex]': 'fixed() ? 0 : null' },
})
export class LineOfLamps {
  readonly line = input.required<LampLine>();
  /** The tag that the red probe is on in the card beside. */
  readonly chosen = input<string>();
  /** A record of what was: lamps are not touched. */
  readonly fixed = input(false);
  readonly choose = output<string>();

  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);

  constructor() {
    effect(() => {
      const tag = this.chosen() ?? this.line().lamps.find(({ next }) => next)?.tag;
      if (tag === undefined) return;
      const rows = this.host.nativeElement.querySelectorAll<HTMLElement>('[data-tag]');
      const row = [...rows].find((each) => each.dataset['tag'] === tag);
      const column = this.host.nativeElement;
      if (!row || column.scrollHeight <= column.clientHeight) return;
      column.scrollTop = row.offsetTop - column.clientHeight / 2 + row.clientHeight;
    });
  }

  /** 0 to 1; the root, so that small shares still differ to the eye. */
  protected widthOf({ share }: LineSection): number {
    return Math.sqrt(share);
  }

  /** What the lamp shows, for those who do not see it. */
  protected words({ tag, label, level, value, stale, next }: Lamp): string {
    const parts = [label ? `${tag}, ${label}` : tag, levelWords[level]];
    if (value) parts.push($localize`${value}:volts: volts`);
    if (stale) parts.push($localize`read in another lift state`);
    if (next) parts.push($localize`next to read`);
    return parts.join(', ');
  }
}

const levelWords: Readonly<Record<Lamp['level'], string>> = {
  live: $localize`live`,
  none: $localize`no volts to the return`,
  between: $localize`between`,
  unread: $localize`not read`,
  'proven dead': $localize`proven dead`,
};
