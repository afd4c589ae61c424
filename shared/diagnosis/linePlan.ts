import { stringSteps, travelOf, type Circuit } from '../circuit';
import type { AdviceRequest } from './advice';
import type { Belief } from './belief';
import { confirmPlan, type ConfirmPlan } from './confirmPlan';
import type { Hypothesis } from './hypotheses';

/** A share of a group under this does not stretch the part of the line that is left. */
const NEGLIGIBLE = 0.005;
/** What a fault beside the line costs to confirm at the controller, readings (judgement). */
const READINGS_BESIDE = 2;

/** The confirm plan of the first string, asked by sets of hypotheses: the cost-to-go of a roll-out. */
export class LinePlan {
  private readonly plan: ConfirmPlan;
  /** Position on the line by part name. */
  private readonly positions = new Map<string, number>();
  private readonly places: ReadonlyMap<string, number>;
  readonly tags: readonly string[];

  constructor(
    private readonly circuit: Circuit,
    request: AdviceRequest,
    private readonly hypotheses: readonly Hypothesis[],
    private readonly belief: Belief,
  ) {
    const line = circuit.strings[0]!;
    const steps = stringSteps(circuit, line);
    this.tags = steps.length === 0 ? [] : [steps[0]!.from, ...steps.map(({ to }) => to)];
    steps.forEach(({ parts }, k) => {
      for (const part of parts) this.positions.set(part, k);
    });
    const names = circuit.places.map(({ name }) => name);
    this.places = new Map(names.map((name, k) => [name, k]));
    const reached = (tag: string): readonly number[] => {
      const terminal = circuit.terminals.find((each) => each.tag === tag);
      if (!terminal?.reachable || request.unreachable.includes(tag)) return [];
      return terminal.places.map((name) => this.places.get(name)!);
    };
    const both = (a: string, b: string) => reached(a).filter((k) => reached(b).includes(k));
    const travel = travelOf(circuit);
    const weights = new Array<number>(steps.length).fill(0);
    hypotheses.forEach(({ fault }, h) => {
      const at = fault && this.positions.get(fault.part);
      if (at !== undefined) weights[at]! += belief.shares[h]!;
    });
    this.plan = confirmPlan({
      weights,
      cuts: this.tags.map((tag) => both(tag, line.return)),
      direct: steps.map(({ from, to }) => both(from, to)),
      minutes: names.map((from) => names.map((to) => travel.minutesToRead(from, to))),
    });
  }

  /** Position on the line of a part; undefined beside it. */
  positionOf(part: string): number | undefined {
    return this.positions.get(part);
  }

  /**
   * Whether measuring across this part is a test of the plan: an end of what is left, or beside the line.
   * In the middle it leaves two stretches, which the plan's cost does not know.
   */
  tests(part: string, members: readonly number[]): boolean {
    const at = this.positions.get(part);
    const span = this.spanOf(members);
    return at === undefined || span === undefined || at === span[0] || at === span[1] - 1;
  }

  /** First and last tag of what these hypotheses leave of the line; undefined where nothing is. */
  stretchOf(members: readonly number[]): readonly [string, string] | undefined {
    const span = this.spanOf(members);
    return span && [this.tags[span[0]]!, this.tags[span[1]]!];
  }

  /**
   * Expected minutes from here to a confirmed fault among these hypotheses, times their belief.
   * @param confirmed parts that the reading just taken measures directly
   */
  cost(members: readonly number[], place: string, confirmed: ReadonlySet<string>): number {
    let beside = 0;
    const line: number[] = [];
    for (const h of members) {
      const { fault } = this.hypotheses[h]!;
      if (!fault || confirmed.has(fault.part)) continue;
      if (this.positions.has(fault.part)) line.push(h);
      else beside += this.belief.shares[h]!;
    }
    const span = this.spanOf(line);
    const share = line.reduce((sum, h) => sum + this.belief.shares[h]!, 0);
    // The plan's cost is for all that is believed on the stretch; these are only a part of it.
    const along = span
      ? (this.plan.cost(span[0], span[1], this.places.get(place)!) * share) /
        this.plan.weight(span[0], span[1])
      : 0;
    return along + beside * READINGS_BESIDE * this.circuit.readingMinutes;
  }

  private spanOf(members: readonly number[]): readonly [number, number] | undefined {
    const shares = new Map<number, number>();
    let whole = 0;
    for (const h of members) {
      const { fault } = this.hypotheses[h]!;
      const at = fault && this.positions.get(fault.part);
      if (at === undefined) continue;
      const share = this.belief.shares[h]!;
      whole += share;
      shares.set(at, (shares.get(at) ?? 0) + share);
    }
    const left = [...shares].filter(([, share]) => share > NEGLIGIBLE * whole).map(([at]) => at);
    return left.length === 0 ? undefined : [Math.min(...left), Math.max(...left) + 1];
  }
}
