import { describe, expect, it } from 'vitest';
import { breedWords, petWords } from './petWords.ts';

const pet = (breedName: string, styleName = 'Teddy') => ({ breedName, styleName });

describe('petWords', () => {
  it('names breed and style of one pet', () => {
    expect(petWords([pet('Poodle, toy')])).toBe('Toy poodle, teddy');
    expect(petWords([pet('Shih Tzu', '')])).toBe('Shih Tzu');
  });
  it('counts pets of one breed', () => {
    expect(petWords([pet('Schnauzer, miniature'), pet('Schnauzer, miniature')])).toBe(
      '2 Miniature schnauzers, teddy',
    );
    expect(petWords([pet('Lurcher', 'Bath'), pet('Lurcher', 'Nails')])).toBe('2 Lurchers');
  });
  it('joins different breeds', () => {
    expect(petWords([pet('Pug'), pet('Shih Tzu')])).toBe('Pug & Shih Tzu');
    expect(petWords([])).toBe('');
  });
  it('turns a table name round', () => {
    expect(breedWords('Goldendoodle, small')).toBe('Small goldendoodle');
    expect(breedWords('Lagotto')).toBe('Lagotto');
  });
});
