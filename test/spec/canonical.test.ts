import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { canonicalJson, specHash } from '../../src/spec/canonical.ts';

describe('canonical JSON', () => {
  it('is what RFC 8785, section 3.2, shows', () => {
    const tree = {
      // biome-ignore lint/correctness/noPrecisionLoss: the RFC's own example, to show the rounding
      numbers: [333333333.33333329, 1e30, 4.5, 2e-3, 0.000000000000000000000000001],
      string: '\u20ac$\u000f\nA\'B"\\\\"/',
      literals: [null, true, false],
    };
    // The octets of section 3.2.4, from memory of the RFC.
    expect(canonicalJson(tree)).toBe(
      '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
    );
  });

  it('sorts keys by UTF-16 code units (RFC 8785, section 3.2.3)', () => {
    const tree = { '\u20ac': 1, '\r': 2, '\ufb33': 3, '1': 4, '\ud83d\ude00': 5, '\u0080': 6, '\u00f6': 7 };
    expect(Object.keys(JSON.parse(canonicalJson(tree)))).toHaveLength(7);
    expect(canonicalJson(tree).match(/:\d/g)?.join('')).toBe(':2:4:6:7:1:5:3');
  });

  it('refuses what is not JSON', () => {
    expect(() => canonicalJson(undefined)).toThrow(TypeError);
  });

  it('is hashed as UTF-8 by SHA-256', () => {
    expect(specHash({ b: 'é', a: 1 })).toBe(
      createHash('sha256').update(Buffer.from('{"a":1,"b":"é"}', 'utf8')).digest('hex'),
    );
  });
});
