import { describe, expect, it } from 'vitest';
import type { Circuit } from './circuit';
import { stringCircuit } from './stringNotation';
import { travelOf } from './travel';

const CIRCUIT: Circuit = {
  ...stringCircuit('110 V DC: T0 (pit stop@pit) T1 [LR]'),
  readingMinutes: 0.5,
  places: [
    { name: 'controller', setUpMinutes: 0, shaft: false },
    { name: 'lobby', setUpMinutes: 0, shaft: false },
    { name: 'pit', setUpMinutes: 6, shaft: true },
    { name: 'roof', setUpMinutes: 0, shaft: false },
  ],
  minutes: { controller: { lobby: 2, pit: 9 }, pit: { lobby: 1 } },
};
const travel = travelOf(CIRCUIT);

describe('travel', () => {
  it('takes the shorter way over another place, and pays the set-up on arrival', () => {
    expect(travel.minutes('controller', 'pit')).toBe(2 + 1 + 6);
  });

  it('pays no set-up on leaving, nor at places passed', () => {
    expect(travel.minutes('pit', 'controller')).toBe(3);
    expect(travel.minutes('pit', 'lobby')).toBe(1);
  });

  it('is nothing where one stands: the set-up was paid for the stay', () => {
    expect(travel.minutes('pit', 'pit')).toBe(0);
    expect(travel.minutesToRead('pit', 'pit')).toBe(0.5);
  });

  it('is endless where no way is known', () => {
    expect(travel.minutes('controller', 'roof')).toBe(Infinity);
    expect(travel.minutes('controller', 'elsewhere')).toBe(Infinity);
  });
});
