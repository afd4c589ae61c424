import { finestSections, type Circuit } from '../circuit';
import type { Advice, AdviceRequest, Step } from './advice';
import { Consultation } from './consultation';
import { contradictionOf } from './contradiction';
import { directReading } from './directProof';
import { Evidence } from './evidence';
import { clearedOf, suspectOf } from './explaining';
import { hypothesesOf } from './hypotheses';
import { Predictions } from './predictions';
import { reason } from './reasons';
import { pillarsOf, stoppingOf } from './stopping';
import { Suggesting } from './suggesting';

/** Version of the engine, kept with the advice that was shown. */
export const ENGINE = '3';
const MOST_SUSPECTS = 10;
/** A section believed in more than this is drawn as suspected; less than that, as cleared. */
const SUSPECTED = 0.02;
const CLEARED = 0.001;

export interface Engine {
  /** The same answer to the same request. Never throws on readings, whatever they say. */
  advise(request: AdviceRequest): Advice;
}

/** An engine for one circuit: its tables are made when first needed, and kept. */
export function createEngine(circuit: Circuit): Engine {
  const hypotheses = hypothesesOf(circuit);
  const predictions = new Predictions(circuit, hypotheses);
  const evidence = new Evidence(circuit, hypotheses, predictions);
  return {
    advise: (request) =>
      adviceOf(new Consultation(circuit, hypotheses, predictions, evidence, request)),
  };
}

function adviceOf(about: Consultation): Advice {
  const { belief, circuit, classes } = about;
  const stopping = stoppingOf(about, classes[0] ?? []);
  const { step, expectedMinutes } = stepOf(about, stopping);
  return {
    engine: ENGINE,
    step,
    stopping,
    suspects: classes
      .filter(([first]) => first !== 0)
      .slice(0, MOST_SUSPECTS)
      .map((members) => suspectOf(about, members)),
    cleared: clearedOf(about),
    sections: sectionsOf(about),
    notDescribed: belief.notDescribed,
    nothingWrong: belief.shares[0]!,
    supplyVolts: {
      mean: circuit.nominalVolts * belief.supply.mean,
      deviation: circuit.nominalVolts * belief.supply.deviation,
    },
    ...(expectedMinutes === undefined ? {} : { expectedMinutes }),
  };
}

/** Danger first; then supply and return; then what finds and confirms in the least minutes. */
function stepOf(
  about: Consultation,
  stopping: Advice['stopping'],
): { readonly step: Step; readonly expectedMinutes?: number } {
  if (about.dangers.length > 0) return { step: { kind: 'stop', dangers: [...about.dangers] } };
  const suggesting = new Suggesting(about);
  const proof = suggesting.proof();
  if (proof) return { step: { kind: 'suggestion', suggestion: proof } };
  const contradiction = contradictionOf(about, suggesting);
  if (contradiction) return { step: contradiction };

  const top = about.classes[0] ?? [];
  const sure = stopping.believed && stopping.described;
  if (sure && top[0] === 0 && stopping.withoutAnyOnePair) {
    return { step: { kind: 'nothing wrong', because: [reason('all readings are healthy')] } };
  }
  if (sure && !stopping.direct) {
    const across = suggesting.across(top);
    if (across) return { step: { kind: 'suggestion', suggestion: across } };
  }
  if (sure && stopping.direct && stopping.withoutAnyOnePair) {
    return { step: findingOf(about, top, false) };
  }
  if (sure && stopping.direct) {
    const different = suggesting.different(top);
    return {
      step: different
        ? { kind: 'suggestion', suggestion: different }
        : restingOnOne(about, suggesting, top),
    };
  }
  const next = suggesting.next();
  if (next) {
    return {
      step: { kind: 'suggestion', suggestion: next.suggestion },
      expectedMinutes: next.minutes,
    };
  }
  return { step: { kind: 'exhausted', because: [reason('no reading tells more')] } };
}

/** No different reading would bear it: the one that carries it once more, then the finding, marked. */
function restingOnOne(about: Consultation, suggesting: Suggesting, top: readonly number[]): Step {
  const [pillar] = pillarsOf(about, top);
  const times = about.readings.filter(
    ({ red, black }) => red === pillar?.red && black === pillar.black,
  ).length;
  const repeat = pillar && times < 2 ? suggesting.repeat(pillar.red, pillar.black) : undefined;
  return repeat ? { kind: 'suggestion', suggestion: repeat } : findingOf(about, top, true);
}

function findingOf(about: Consultation, top: readonly number[], restsOnOneReading: boolean): Step {
  return {
    kind: 'finding',
    suspect: suspectOf(about, top),
    restsOnOneReading,
    directObservation: directReading(about, top)!.id,
  };
}

function sectionsOf({ circuit, hypotheses, belief }: Consultation): Advice['sections'] {
  return circuit.strings.flatMap((line) =>
    finestSections(circuit, line).map(({ from, to, parts }) => {
      const probability = belief.shares.reduce((sum, share, h) => {
        const part = hypotheses[h]!.fault?.part;
        return part !== undefined && parts.includes(part) ? sum + share : sum;
      }, 0);
      const state =
        probability > SUSPECTED ? 'suspected' : probability < CLEARED ? 'cleared' : 'unknown';
      return { from, to, parts: [...parts], probability, state };
    }),
  );
}
