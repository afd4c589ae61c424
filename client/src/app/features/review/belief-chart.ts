import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { BeliefLine } from './review-model';

const WIDTH = 640;
const HEIGHT = 150;
const LEFT = 34;
const TOP = 14;

/** How sure the readings made it, over the readings. Lines differ in stroke and carry their names. */
@Component({
  selector: 'app-belief-chart',
  template: `
    <svg [attr.viewBox]="box" role="img" [attr.aria-label]="words()">
      @for (mark of marks; track mark.label) {
        <line
          class="grid"
          [attr.x1]="left"
          [attr.x2]="width"
          [attr.y1]="mark.y"
          [attr.y2]="mark.y"
        />
        <text class="scale" x="0" [attr.y]="mark.y + 4">{{ mark.label }}</text>
      }
      @for (line of drawn(); track line.part; let k = $index) {
        <polyline [attr.points]="line.points" [class]="'line-' + k" />
        @for (dot of line.dots; track $index) {
          @if (k === 0) {
            <circle [attr.cx]="dot.x" [attr.cy]="dot.y" r="3.5" />
          }
        }
      }
    </svg>
    <ul>
      @for (line of drawn(); track line.part; let k = $index) {
        <li>
          <svg viewBox="0 0 28 8" aria-hidden="true">
            <line x1="0" y1="4" x2="28" y2="4" [class]="'line-' + k" />
          </svg>
          {{ line.part }}
          <span class="figures soft">{{ line.last }}</span>
        </li>
      }
    </ul>
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
    }
    svg {
      width: 100%;
    }
    .grid {
      stroke: var(--rule);
    }
    .scale {
      fill: var(--soft);
      font-size: 12px;
    }
    polyline,
    .line-0,
    .line-1,
    .line-2 {
      fill: none;
      stroke: var(--soft);
      stroke-width: 2;
    }
    .line-0 {
      stroke: var(--lamp-text);
      stroke-width: 3;
    }
    .line-2 {
      stroke-dasharray: 5 5;
    }
    circle {
      fill: var(--lamp-text);
    }
    ul {
      display: flex;
      flex-wrap: wrap;
      gap: 4px 18px;
      font-size: var(--text-13);
    }
    li {
      display: flex;
      gap: 6px;
      align-items: center;
    }
    li svg {
      width: 28px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BeliefChart {
  readonly lines = input.required<readonly BeliefLine[]>();

  protected readonly box = `0 0 ${WIDTH} ${HEIGHT}`;
  protected readonly width = WIDTH;
  protected readonly left = LEFT;
  protected readonly marks = [1, 0.5, 0].map((value) => ({ label: String(value), y: yOf(value) }));
  protected readonly drawn = computed(() =>
    this.lines().map(({ part, values }) => {
      const step = (WIDTH - LEFT - 8) / Math.max(1, values.length - 1);
      const dots = values.map((value, k) => ({ x: LEFT + k * step, y: yOf(value) }));
      return {
        part,
        dots,
        points: dots.map(({ x, y }) => `${x.toFixed(1)},${y.toFixed(1)}`).join(' '),
        last: `${((values.at(-1) ?? 0) * 100).toFixed(0)} %`,
      };
    }),
  );
  protected readonly words = computed(() =>
    this.drawn()
      .map(({ part, last }) => $localize`${part}:part: ends at ${last}:share:`)
      .join('; '),
  );
}

const yOf = (value: number): number => TOP + (1 - value) * (HEIGHT - 2 * TOP);
