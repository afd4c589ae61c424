import type { Observation } from '../diagnosis';
import type { CaseState } from './caseState';
import type { KnownEvent } from './event';
import type { EventType } from './payloads';

type Known<T extends EventType> = Extract<KnownEvent, { type: T }> & { readonly actor?: string };
type Handler<T extends EventType> = (state: CaseState, event: Known<T>) => CaseState;

const see = (
  state: CaseState,
  event: KnownEvent,
  observation: Observation,
  answers?: string,
): CaseState => ({
  ...state,
  state: event.state,
  seen: [
    ...state.seen,
    {
      observation,
      recordedAt: event.recordedAt,
      stage: state.repairs.length > 0 ? 'after repair' : 'finding',
      answers,
    },
  ],
});

/** What each type of event does to the case. Opening and withdrawing are in `foldCase.ts`. */
export const handlers: {
  readonly [T in Exclude<EventType, 'case opened'>]: Handler<T>;
} = {
  'arrival checked': (state, { payload, recordedAt, state: lift }) => ({
    ...state,
    state: lift,
    arrival: { ...payload, at: recordedAt },
  }),
  'reading taken': (state, event) => {
    const { red, black, function: meterFunction, volts, meter, place, answers } = event.payload;
    return {
      ...see(
        state,
        event,
        {
          kind: 'reading',
          id: event.id,
          red,
          black,
          function: meterFunction,
          volts,
          meter,
          state: event.state,
          place,
        },
        answers,
      ),
      place,
    };
  },
  'relay seen': (state, event) => {
    const { relay, position, answers } = event.payload;
    return see(
      state,
      event,
      { kind: 'relay', id: event.id, relay, position, state: event.state },
      answers,
    );
  },
  'device seen': (state, event) => {
    const { part, seen } = event.payload;
    return see(state, event, { kind: 'device', id: event.id, part, seen, state: event.state });
  },
  'could not reach': (state, { payload }) => ({
    ...state,
    unreachable: [...new Set([...state.unreachable, payload.what])],
  }),
  'suggestion declined': (state, { payload }) => ({
    ...state,
    declined: [...new Set([...state.declined, payload.key])],
  }),
  'place changed': (state, { payload }) => ({ ...state, place: payload.place }),
  'state changed': (state, event) => ({ ...state, state: event.state }),
  // The withdrawn event has left the fold already.
  'event withdrawn': (state) => state,
  'caution acknowledged': (state, { payload }) => ({
    ...state,
    acknowledged: [
      ...state.acknowledged,
      ...payload.codes.map((code) => ({ code, place: payload.place })),
    ],
  }),
  'advice shown': (state, { id, payload, recordedAt }) => ({
    ...state,
    advice: [...state.advice, { ...payload, id, at: recordedAt }],
  }),
  'danger raised': (state, { payload, recordedAt }) => ({
    ...state,
    dangers: [...state.dangers, { ...payload.danger, at: recordedAt }],
  }),
  'link fitted': (state, { payload, recordedAt }) => ({
    ...state,
    links: [...state.links, { ...payload, fittedAt: recordedAt }],
  }),
  'link removed': (state, { payload, recordedAt }) => ({
    ...state,
    links: state.links.map((link) =>
      link.link === payload.link ? { ...link, removedAt: recordedAt } : link,
    ),
  }),
  'thing disturbed': (state, { payload, recordedAt }) => ({
    ...state,
    disturbed: [...state.disturbed, { ...payload, at: recordedAt }],
  }),
  'thing restored': (state, { payload, recordedAt }) => ({
    ...state,
    disturbed: state.disturbed.map((thing) =>
      thing.thing === payload.thing ? { ...thing, restoredAt: recordedAt } : thing,
    ),
  }),
  'person entered': (state, { payload, recordedAt }) => ({
    ...state,
    people: [...state.people, { ...payload, since: recordedAt }],
  }),
  'person left': (state, { payload, recordedAt }) => ({
    ...state,
    people: state.people.map((person) =>
      person.entry === payload.entry ? { ...person, left: recordedAt } : person,
    ),
  }),
  isolated: (state, { payload, recordedAt }) => ({
    ...state,
    isolated: { ...payload, at: recordedAt },
  }),
  're-energised': (state) => ({ ...state, isolated: undefined }),
  'finding stated': (state, { id, payload, recordedAt }) => ({
    ...state,
    finding: { ...payload, id, at: recordedAt },
  }),
  'repair done': (state, { payload, recordedAt }) => ({
    ...state,
    repairs: [...state.repairs, { ...payload, at: recordedAt }],
    // What was proven or read before this repair says nothing about the lift after it.
    proven: [],
    service: undefined,
  }),
  'device proven': (state, { id, payload, recordedAt }) => ({
    ...state,
    proven: [
      ...state.proven.filter(({ device }) => device !== payload.device),
      { ...payload, at: recordedAt },
    ],
    dangers:
      payload.result === 'did not stop'
        ? [
            ...state.dangers,
            {
              code: 'device does not open string',
              part: payload.device,
              observations: [id],
              at: recordedAt,
            },
          ]
        : state.dangers,
  }),
  'returned to service': (state, { payload, recordedAt }) => ({
    ...state,
    service: { ...payload, at: recordedAt },
  }),
  'note written': (state, { payload, recordedAt, actor }) => ({
    ...state,
    notes: [...state.notes, { text: payload.text, at: recordedAt, actor }],
  }),
  'case closed': (state, { payload, recordedAt }) => ({
    ...state,
    status: 'closed',
    outcome: payload.outcome,
    remark: payload.remark,
    closedAt: recordedAt,
  }),
  'review accepted': (state, { payload, recordedAt, actor }) => ({
    ...state,
    status: 'accepted',
    reviews: [...state.reviews, { kind: 'accepted', text: payload.remark, at: recordedAt, actor }],
  }),
  'review returned': (state, { payload, recordedAt, actor }) => ({
    ...state,
    status: 'returned',
    reviews: [
      ...state.reviews,
      { kind: 'returned', text: payload.question, at: recordedAt, actor },
    ],
  }),
};
