import { describe, expect, it } from 'vitest';
import { nearest } from '../../src/spec/nearest.ts';

describe('nearest', () => {
  it.each([
    ['titel', ['title', 'question'], 'title'],
    ['Title', ['title'], 'title'],
    ['adjustedFor', ['added', 'adjusted_for'], 'adjusted_for'],
    ['sample_size', ['power', 'sample-size'], 'sample-size'],
    ['linear nested', ['linear-nested', 'linear-overall'], 'linear-nested'],
    ['f', ['f2'], null],
    ['cat', ['dog'], null],
    ['', ['a'], null],
    ['x'.repeat(1000), ['x'.repeat(999)], null],
    ['anything', [], null],
  ])('of %j among %j is %j', (word, candidates, expected) => {
    expect(nearest(word, candidates)).toBe(expected);
  });
});
