import { describe, expect, it } from 'vitest';
import { fitted, textWidth } from '../../../src/document/figures/label.ts';

describe('fitted', () => {
  it('breaks at spaces and keeps the text whole where it fits', () => {
    const label = fitted('the difference between the means', 110, 3);
    expect(label.lines).toEqual(['the difference', 'between the', 'means']);
    expect(label.full).toBeNull();
  });

  it('shortens what does not fit and keeps the whole text beside it', () => {
    const label = fitted('supercalibratedinstrument', 80, 1);
    expect(label.lines).toEqual(['supercalib…']);
    expect(label.full).toBe('supercalibratedinstrument');
    expect(label.width).toBeLessThanOrEqual(80);
  });

  it('does not cut a character that is written with several code points', () => {
    expect(fitted('e\u0301'.repeat(30), 40, 1).lines).toEqual([`${'e\u0301'.repeat(4)}…`]);
  });

  it('gives no lines for an empty text', () => {
    expect(fitted(' ', 80, 2)).toEqual({ lines: [], full: null, width: 0, height: 0 });
  });

  it('counts square characters as wider than letters', () => {
    expect(textWidth('検出力')).toBeGreaterThan(1.6 * textWidth('abc'));
  });
});
