import { describe, expect, it } from 'vitest';
import { nextLetter } from './letters';

describe('the next letter', () => {
  it('starts at A, leaves gaps alone and goes on after Z', () => {
    expect(nextLetter([])).toBe('A');
    expect(nextLetter(['C', 'A'])).toBe('D');
    expect(nextLetter(['Y', 'Z'])).toBe('AA');
    expect(nextLetter(['Z', 'AZ'])).toBe('BA');
  });

  it('ends after ZZ', () => {
    expect(nextLetter(['ZY'])).toBe('ZZ');
    expect(nextLetter(['ZZ'])).toBeNull();
  });
});
