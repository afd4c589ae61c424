import type { Circuit } from '../circuit';
import { normalised, SUPPLY_DEVIATION, SUPPLY_FACTORS, type Belief } from './belief';
import { NOT_DESCRIBED_PRIOR, type Hypothesis } from './hypotheses';
import { anywhere, readingLikelihood, relayLikelihood, slipAfter } from './likelihood';
import type { Observation } from './observation';
import { pieces, type ReadingPiece, type RelayPiece } from './pieces';
import type { Predictions } from './predictions';

/** What one observation says: log-likelihoods by hypothesis and supply factor, and of *not described*. */
interface Weight {
  readonly logs: Float64Array;
  readonly other: number;
}

/** Half of the relays are in, as far as something that the circuit does not describe tells. */
const RELAY_ANYHOW = 0.5;
/** Observations whose weights are kept; a long case has some hundreds. */
const MOST_KEPT = 2000;

/** Weighs what was seen, each piece once, and keeps the weights: leaving one out is a sum without it. */
export class Evidence {
  private readonly weights = new Map<string, Weight>();
  private readonly prior: Float64Array;
  private readonly scale: number;

  constructor(
    private readonly circuit: Circuit,
    private readonly hypotheses: readonly Hypothesis[],
    private readonly predictions: Predictions,
  ) {
    this.scale = Math.max(circuit.nominalVolts, 1);
    const width = SUPPLY_FACTORS.length;
    const before = SUPPLY_FACTORS.map((factor) => -0.5 * ((factor - 1) / SUPPLY_DEVIATION) ** 2);
    const sum = before.reduce((total, log) => total + Math.exp(log), 0);
    this.prior = new Float64Array(hypotheses.length * width);
    hypotheses.forEach(({ prior }, h) => {
      before.forEach((log, s) => (this.prior[h * width + s] = Math.log(prior / sum) + log));
    });
  }

  /**
   * What to believe after the observations, in whatever order, with the supply's volts unknown and learnt:
   * every hypothesis is weighed at every supply factor, and the factors are summed out. A set-up that
   * agrees with itself is weighed once, so that a repeat adds almost nothing; one that contradicts itself
   * is weighed at each of its values.
   */
  belief(observations: readonly Observation[]): Belief {
    const logs = this.prior.slice();
    let other = Math.log(NOT_DESCRIBED_PRIOR);
    for (const piece of pieces(this.circuit, observations)) {
      const weight = this.weigh(piece);
      for (let k = 0; k < logs.length; k++) logs[k]! += weight.logs[k]!;
      other += weight.other;
    }
    return normalised(logs, other, this.hypotheses.length);
  }

  private weigh(piece: ReadingPiece | RelayPiece): Weight {
    const key = JSON.stringify(piece);
    let weight = this.weights.get(key);
    if (!weight) {
      weight = piece.kind === 'reading' ? this.ofReading(piece) : this.ofRelay(piece);
      if (this.weights.size >= MOST_KEPT) this.weights.clear();
      this.weights.set(key, weight);
    }
    return weight;
  }

  private ofReading({ volts, times, meter, ...piece }: ReadingPiece): Weight {
    const width = SUPPLY_FACTORS.length;
    const logs = new Float64Array(this.prior.length);
    const row = this.predictions.readings(piece.state, { ...piece, ohms: meter.ohms });
    row.forEach((predicted, h) => {
      SUPPLY_FACTORS.forEach((factor, s) => {
        const scaled = { ...predicted, volts: predicted.volts * factor };
        logs[h * width + s] = Math.log(
          readingLikelihood(volts, scaled, meter, this.scale, slipAfter(times)),
        );
      });
    });
    return { logs, other: Math.log(anywhere(this.scale)) };
  }

  private ofRelay(seen: RelayPiece): Weight {
    const width = SUPPLY_FACTORS.length;
    const logs = new Float64Array(this.prior.length);
    this.predictions.relay(seen.state, seen.relay).forEach((position, h) => {
      logs.fill(Math.log(relayLikelihood(seen.position, position)), h * width, (h + 1) * width);
    });
    return { logs, other: Math.log(RELAY_ANYHOW) };
  }
}
