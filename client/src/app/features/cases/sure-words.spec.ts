import { inHundred } from './sure-words';

describe('inHundred', () => {
  it.each([
    [1, 'more than 99 in 100'],
    [0.995, 'more than 99 in 100'],
    [0.99, '99 in 100'],
    [0.48, '48 in 100'],
    [0.057, '5.7 in 100'],
    [0.0004, 'under 0.1 in 100'],
    [0, 'under 0.1 in 100'],
  ])('says %d as %s', (probability, words) => {
    expect(inHundred(probability)).toBe(words);
  });
});
