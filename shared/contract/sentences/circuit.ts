/** Findings on a circuit. */
export const circuitSentences = {
  'circuit.shape': 'This is not a circuit in the format that Lampline reads: {problem} at {at}.',
  'circuit.unknown-kind': 'There is no part of this kind at {at}.',
  'circuit.out-of-range':
    'A value at {at} is out of range[: at least {minimum}][: at most {maximum}].',
  'circuit.coil-never-energised': 'Nothing can energise coil {part} in any lift state.',
  'circuit.condition-moves-nothing': 'No contact listens to condition {name}.',
  'circuit.drop-out-above-pull-in':
    'Coil {part} would drop out above the current that pulls it in.',
  'circuit.pull-in-above-rated':
    'Coil {part} needs more current to pull in than the {ratedMilliamps} mA that it takes at its rated volts.',
  'circuit.duplicate-tag': 'Tag {name} stands on two terminals.',
  'circuit.duplicate-part': 'Two parts are called {name}.',
  'circuit.duplicate-place': 'Two places are called {name}.',
  'circuit.duplicate-condition': 'Two conditions are called {name}.',
  'circuit.duplicate-value': 'A condition has the value {name} twice.',
  'circuit.duplicate-string': 'Two strings are called {name}.',
  'circuit.floating-part': 'Part {part} hangs free: no way leads from it to a supply.',
  'circuit.missing-prior': 'Part {part} has a weight of 0: as drawn it never fails.',
  'circuit.no-priors': 'No part has a weight: nothing would ever be suspected.',
  'circuit.no-modes': 'Part {part} has a weight but no way to fail.',
  'circuit.no-controller': 'No place is the controller.',
  'circuit.no-frequency': 'Supply {part} is alternating and has no frequency.',
  'circuit.pair-without-place': 'No place reaches both {red} and {black}.',
  'circuit.part-on-one-terminal': 'Part {part} begins and ends on the same terminal.',
  'circuit.place-without-way': 'No way with minutes leads to {name}.',
  'circuit.places-without-return': 'The return of string {string} is not reached from: {places}.',
  'circuit.reserved-tag': 'Tag {name} is reserved.',
  'circuit.string-current-without-source':
    'The strings should carry {current} current, and nothing supplies it.',
  'circuit.string-path-not-found':
    'No way leads along string {string} from its first tag to its last.',
  'circuit.string-without-supply': 'String {string} has no supply.',
  'circuit.terminal-with-one-part': 'Only one part is joined to terminal {tag}.',
  'circuit.terminal-without-part': 'No part is joined to terminal {tag}.',
  'circuit.unknown-condition': 'There is no condition {name}.',
  'circuit.unknown-condition-value': 'The condition at {at} has no value {name}.',
  'circuit.unknown-place': 'There is no place {name}.',
  'circuit.unknown-relay': 'There is no relay {name}.',
  'circuit.unknown-terminal': 'There is no terminal {name}.',
  'solver.several-frequencies-with-bridge':
    'Supplies of different frequencies ({frequencies}) behind a bridge cannot be solved.',
} as const;
