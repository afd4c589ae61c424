import { describe, expect, it } from 'vitest';
import { pseudoText } from './pseudoText';

describe('the pseudo-locale', () => {
  it('brackets a text and accents its letters', () => {
    expect(pseudoText('Not sent yet')).toBe('⟦Ñót séñt ýét⟧');
  });

  it('leaves placeholders as they are', () => {
    expect(pseudoText('{$INTERPOLATION} kept on {name}')).toBe('⟦{$INTERPOLATION} képt óñ {name}⟧');
  });

  it('goes into each form of a choice, and leaves the choice itself', () => {
    expect(pseudoText('{VAR_PLURAL, plural, =1 {one case} other {{INTERPOLATION} cases}}')).toBe(
      '{VAR_PLURAL, plural, =1 {⟦óñé çásé⟧} other {⟦{INTERPOLATION} çásés⟧}}',
    );
  });
});
