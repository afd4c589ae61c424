import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { LampLevel } from './line-model';

/**
 * The standard lamp sign (a circle with a cross, IEC 60617): filled when live, hollow without volts, half
 * filled between, a dot when not read, a square around it when proven dead, hatched when stale.
 */
@Component({
  selector: 'app-lamp',
  templateUrl: './lamp.html',
  styleUrl: './lamp.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { 'aria-hidden': 'true' },
})
export class LampSign {
  readonly level = input.required<LampLevel>();
  readonly stale = input(false);
  readonly next = input(false);
}
