import { CONTROLLER } from '../../shared/circuit';
import { landing, type LineDevice } from './seriesLine';

/**
 * The devices of a usual chain with their weights, resets and inspections (common practice and judgement:
 * per cent of true chain-open calls; each company replaces them with its own counts).
 * @param tag makes the tag after the nth step, with a letter inside a group
 */
export interface LineNaming {
  readonly tag: (step: number, inside?: number) => string;
  readonly landings: number;
}

export function stopLine({ tag }: LineNaming): LineDevice[] {
  return [
    {
      name: 'motor overload contact',
      place: CONTROLLER,
      tag: tag(1),
      weight: 4,
      reset: 'manual',
      inspection: 'Feel or look at the trip flag; measure three currents before any reset.',
    },
    {
      name: 'machine-room stop',
      place: CONTROLLER,
      tag: tag(2),
      places: [CONTROLLER, 'machine room'],
      weight: 2,
      reset: 'maintained',
      inspection: 'Look; work it twice; check its wires.',
    },
    {
      name: 'governor switch',
      place: 'machine room',
      tag: tag(3),
      places: ['machine room', CONTROLLER, 'shaft top'],
      weight: 4,
      reset: 'manual',
      inspection: 'Flag or lever, jaws, rope; is the safety gear set? Ask why before any reset.',
    },
    {
      name: 'top final limit',
      place: 'shaft top',
      tag: tag(4),
      places: ['shaft top', CONTROLLER, 'pit'],
      weight: 3,
      inspection: 'Where is the car? Roller and ramp.',
    },
    {
      name: 'bottom final limit',
      place: 'pit',
      tag: tag(5),
      places: ['pit', CONTROLLER],
      weight: 3,
      inspection: 'Where is the car? Water, dirt, roller.',
    },
    {
      name: 'pit stop',
      place: 'pit',
      tag: tag(5, 1),
      weight: 3,
      ohms: 0.1,
      reset: 'maintained',
      inspection: 'Look from the bottom landing with a torch before you enter.',
    },
    {
      name: 'tension-weight switch',
      place: 'pit',
      tag: tag(5, 2),
      weight: 3,
      ohms: 0.1,
      inspection: 'Height of the weight over the floor; arm mark.',
    },
    {
      name: 'buffer switch',
      place: 'pit',
      tag: tag(6),
      places: ['pit', CONTROLLER, 'car top'],
      weight: 1,
      ohms: 0.1,
      inspection: 'Plunger fully out? Oil level.',
    },
    {
      name: 'car-top stop',
      place: 'car top',
      tag: tag(6, 1),
      weight: 3,
      ohms: 0.1,
      reset: 'maintained',
      inspection: 'Look from the landing above before you step on.',
    },
    {
      name: 'safety-gear switch',
      place: 'car top',
      tag: tag(7),
      places: ['car top', CONTROLLER, 'in car'],
      weight: 3,
      ohms: 0.1,
      reset: 'manual',
      inspection: 'Linkage, marks on the guide rails. A set safety gear: stop and escalate.',
    },
    {
      name: 'car stop',
      place: 'in car',
      tag: tag(8),
      label: 'end of the stop line',
      places: ['in car', CONTROLLER, 'car top'],
      weight: 5,
      reset: 'maintained',
      inspection: 'Ask, look; work it only after everyone is seen or spoken to.',
    },
  ];
}

/** Weights of the whole door and lock groups, shared by the landings. */
const DOORS_WEIGHT = 14;
const LOCKS_WEIGHT = 27;

export function doorLine({ tag, landings }: LineNaming): LineDevice[] {
  const numbers = Array.from({ length: landings }, (_, k) => k + 1);
  const group = (
    name: string,
    step: number,
    whole: number,
    label: string,
    inspection: string,
  ): LineDevice[] =>
    numbers.map((k) => ({
      name: `${name}, landing ${k}`,
      place: landing(k),
      tag: k === landings ? tag(step) : tag(step - 1, k),
      ...(k === landings ? { label } : {}),
      places:
        k === landings
          ? [landing(k), CONTROLLER, ...(step === 10 ? [landing(1)] : [])]
          : [landing(k), landing(k + 1)],
      weight: whole / landings,
      ohms: 0.05,
      inspection,
    }));
  return [
    {
      name: 'car gate contact',
      place: 'car top',
      tag: tag(9),
      label: 'behind the gate',
      places: ['car top', CONTROLLER, landing(1)],
      weight: 20,
      inspection: 'Feed made safe; close by hand, press gently, watch the finger follow 3 to 6 mm.',
    },
    ...group(
      'door contact',
      10,
      DOORS_WEIGHT,
      'behind the landing doors',
      'Which one? Push each door home; sill, hinge, finger.',
    ),
    ...group(
      'lock contact',
      11,
      LOCKS_WEIGHT,
      'behind the locks',
      'Bolt home before the contact makes; keeper, roller arm, spring, wires.',
    ),
  ];
}
