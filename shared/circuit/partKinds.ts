import type { FaultMode, Part, PartKind } from './circuit';

/**
 * A direct measurement that can show a fault of a part by itself.
 * - `across`: both probes on the part's own terminals.
 * - `both sides`: live and dead on its two sides, to the same return, from one place.
 * - `output`: across what it feeds, with its input proven.
 * - `armature`: the coil's volts together with the relay's position seen.
 * - `with condition`: a reading in a state in which the part must be open.
 * - `isolated`: insulation to earth, dead; no live reading shows it for sure.
 */
export type Proof = 'across' | 'both sides' | 'output' | 'armature' | 'with condition' | 'isolated';

export interface ModeBehaviour {
  readonly mode: FaultMode;
  /** Relative frequency among the kind's modes, 0 to 1. */
  readonly share: number;
  readonly proofs: readonly Proof[];
}

/** What the engine has to know of a kind besides its stamp in the solver. */
export interface PartKindBehaviour {
  /** In series with the current of a string: a string's path may run through it. */
  readonly series: boolean;
  /** Something that takes current from a string and does something with it. */
  readonly load: boolean;
  /** Something that can drive current. */
  readonly source: boolean;
  readonly modes: readonly ModeBehaviour[];
}

const mode = (name: FaultMode, share: number, ...proofs: Proof[]): ModeBehaviour => ({
  mode: name,
  share,
  proofs,
});

const wire = {
  series: true,
  load: false,
  source: false,
  modes: [mode('open', 0.85, 'across', 'both sides'), mode('resistive', 0.15, 'across')],
} as const;

/**
 * The table of kinds. Shares without a source are judgement, to be replaced by an organisation's own
 * accepted cases; those of diodes are short .49, open .36, drift .15 (MIL-HDBK-338B, failure mode
 * distributions of rectifiers; drift is left out because it shows in no reading).
 */
export const PART_KINDS: Readonly<Record<PartKind, PartKindBehaviour>> = {
  supply: {
    series: false,
    load: false,
    source: true,
    modes: [
      mode('dead', 0.4, 'output'),
      mode('low', 0.4, 'output'),
      mode('high', 0.1, 'output'),
      mode('weak', 0.1, 'output'),
    ],
  },
  transformer: {
    series: false,
    load: false,
    source: false,
    modes: [mode('dead', 0.7, 'output'), mode('low', 0.2, 'output'), mode('weak', 0.1, 'output')],
  },
  bridge: {
    series: false,
    load: false,
    source: false,
    modes: [mode('diode shorted', 0.49, 'output'), mode('diode open', 0.36, 'output')],
  },
  contact: {
    series: true,
    load: false,
    source: false,
    modes: [
      mode('open', 0.75, 'across', 'both sides'),
      mode('resistive', 0.2, 'across'),
      mode('not opening', 0.05, 'with condition'),
    ],
  },
  core: wire,
  conductor: wire,
  link: wire,
  fuse: {
    series: true,
    load: false,
    source: false,
    modes: [mode('blown', 0.95, 'across', 'both sides'), mode('resistive', 0.05, 'across')],
  },
  lamp: { series: false, load: true, source: false, modes: [mode('open', 1, 'across')] },
  resistor: {
    series: true,
    load: false,
    source: false,
    modes: [mode('open', 0.8, 'across', 'both sides'), mode('resistive', 0.2, 'across')],
  },
  coil: {
    series: false,
    load: true,
    source: false,
    modes: [
      mode('open', 0.7, 'armature'),
      mode('partly shorted', 0.1, 'armature'),
      mode('stuck out', 0.15, 'armature'),
      mode('stuck in', 0.05, 'armature'),
    ],
  },
  capacitor: { series: false, load: false, source: false, modes: [] },
};

/** A part's own shares where it has them, else its kind's; in the kind's order, zero shares left out. */
export function modesOf(part: Part): readonly ModeBehaviour[] {
  const { modes } = PART_KINDS[part.kind];
  const own = part.modeWeights;
  if (!own) return modes;
  return modes
    .map((each) => ({ ...each, share: own[each.mode] ?? 0 }))
    .filter(({ share }) => share > 0);
}

/** What would prove this mode on this part directly; empty where the kind does not have the mode. */
export function proofsOf(part: Part, faultMode: FaultMode): readonly Proof[] {
  return PART_KINDS[part.kind].modes.find((each) => each.mode === faultMode)?.proofs ?? [];
}
