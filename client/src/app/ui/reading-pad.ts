import { ChangeDetectionStrategy, Component, computed, input, model, output } from '@angular/core';
import { FormsModule } from '@angular/forms';
import { afterKey, padValue } from './pad-model';

export interface PadReading {
  readonly volts: number;
  readonly entered: 'digits' | 'same as supply' | 'zero';
}

/** Large keys for gloves: digits, *same as* the proven supply, *zero*, save. What is typed stays until saved. */
@Component({
  selector: 'app-reading-pad',
  imports: [FormsModule],
  templateUrl: './reading-pad.html',
  styleUrl: './reading-pad.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadingPad {
  /** What stands in the display. */
  readonly text = model('');
  readonly direct = input.required<boolean>();
  /** The supply as it was read, and on which tag; without it *same as* is not offered. */
  readonly supply = input<{ readonly tag: string; readonly volts: number }>();
  readonly canUndo = input(false);
  /** The suggestion can be set aside; a reading chosen by hand can't. */
  readonly asked = input(true);
  readonly busy = input(false);

  /** A practice lift: its meter can be asked what the probes show. */
  readonly practice = input(false);

  readonly practise = output();
  readonly save = output<PadReading>();
  readonly cannotReach = output();
  readonly notSure = output();
  readonly undo = output();

  protected readonly keys = ['7', '8', '9', '4', '5', '6', '1', '2', '3', '±', '0', '.'];
  protected readonly value = computed(() => padValue(this.text(), this.direct()));
  protected readonly problem = computed(() => {
    const value = this.value();
    return value.kind === 'problem' ? value.problem : undefined;
  });
  /** The value as it is taken, where the probes are swapped. */
  protected readonly swapped = computed(() => {
    const value = this.value();
    return value.kind === 'volts' && value.swapped ? `−${Math.abs(value.volts)}` : undefined;
  });
  private from: PadReading['entered'] = 'digits';

  protected press(key: string): void {
    this.from = 'digits';
    this.text.set(afterKey(this.text(), key));
  }

  protected typed(text: string): void {
    this.from = 'digits';
    this.text.set(text);
  }

  protected sameAsSupply(): void {
    const supply = this.supply();
    if (!supply) return;
    this.from = 'same as supply';
    this.text.set(supply.volts.toFixed(1));
  }

  protected zero(): void {
    this.from = 'zero';
    this.text.set('0.0');
  }

  protected saveIt(): void {
    const value = this.value();
    if (value.kind !== 'volts' || this.busy()) return;
    this.save.emit({ volts: value.volts, entered: this.from });
    this.from = 'digits';
  }
}
