import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { check, ProblemError, render, renderAll, solve } from '../../src/index.ts';
import { type NestedChanges, nestedSpec } from '../support/nested-spec.ts';

const KINDS = ['ethics', 'grant', 'preregistration', 'protocol', 'appendix'] as const;

function markdown(kind: (typeof KINDS)[number], changes: NestedChanges = {}): string {
  return render(nestedSpec(changes), kind, 'markdown').content;
}

/** Markdown without the escapes and marks that a reader does not see. */
function visible(text: string): string {
  return text.replace(/\\(?=[!-/:-@[-`{-~])/g, '').replace(/[\u2066-\u2069]/g, '');
}

describe.each(KINDS)('the %s document', (kind) => {
  const page = markdown(kind);

  test('states question, aim, role, outcome with unit, test, alpha, power and hypotheses', () => {
    for (const part of [
      'Do three measures explain the outcome beyond five others?',
      'Primary aim',
      'an invented outcome (points)',
      'partial F test',
      'significance level of .05',
      'power of .90',
      'null hypothesis',
    ]) {
      expect(page).toContain(part);
    }
  });

  test('states the effect in two forms, in words, with its basis and its reason', () => {
    expect(page).toContain('partial R² of .06');
    expect(page).toContain('f² of .0638');
    expect(page).toMatch(/6\s% of the variance/);
    expect(page).toContain('smallest effect of interest');
    expect(page).toContain('An invented committee judged');
  });

  test('states analysed and enrolled numbers, every loss, degrees of freedom and what can be detected', () => {
    for (const part of [
      '**235**',
      '**282**',
      'declines to take part',
      'has no usable measurement',
      '3 and 226',
    ]) {
      expect(page).toContain(part);
    }
    expect(page).toMatch(/smallest effect that 235 analysed would detect/);
  });

  test('says what happens if assumptions fail, cites its method, names its maker, and asks for review', () => {
    expect(page).toContain('If the partial R² is .04');
    expect(page).toContain('Gatsonis');
    expect(page).toMatch(/Samplecase \d+\.\d+\.\d+/);
    expect(page).toContain('qualified statistician');
    expect(page).toMatch(/ethics committee, the regulator and local rules/);
    expect(page).toContain('## References');
  });

  test('an F test has no sides (M22), and a power is never printed as reached when it is not', () => {
    expect(page).not.toMatch(/two-sided|one-sided|two-tailed/);
    expect(page).toContain('.899');
  });
});

describe('a limit of words', () => {
  const limited = (words: number) => {
    const documents = [{ kind: 'grant', words, formats: ['markdown'] }];
    const { report } = check(nestedSpec({ documents }));
    if (report === null) throw new Error('no report');
    const [document] = renderAll(report);
    if (document === undefined) throw new Error('no document');
    return document;
  };

  test('leaves out optional sentences until the document fits, and says how many words it has', () => {
    const whole = limited(5000);
    const short = limited(Math.round(whole.words * 0.7));
    expect(short.words).toBeLessThanOrEqual(Math.round(whole.words * 0.7));
    expect(short.remarks[0]).toMatch(/^grant: \d+ words of at most \d+ \(left out: /);
    expect(short.content).toContain('**235**');
  });

  test('leaves out the same sentences first: what goes at a looser limit goes at a tighter one too', () => {
    const droppedAt = (words: number) =>
      /left out: (.*)\)/.exec(limited(words).remarks[0] ?? '')?.[1]?.split(', ') ?? [];
    const loose = droppedAt(400);
    expect(droppedAt(300).slice(0, loose.length)).toEqual(loose);
  });

  test('says so when what may not be dropped is longer', () => {
    expect(limited(20).remarks[0]).toContain('what is left may not be dropped');
  });
});

describe('what a user wrote', () => {
  const HOSTILE = [
    '<script>alert(1)</script>',
    'a | b',
    '*not bold*',
    '{{enrol}}',
    '[x](javascript:y)',
    '# no heading',
    'שלום \u202Eabc',
    '&amp;',
    '`code`',
    '_x_',
    '<img src=x onerror=y>',
  ];

  test.each(HOSTILE)('%s is printed as typed in Markdown, and is only text in HTML', (text) => {
    const study = { title: `T ${text}`, population: text };
    const page = visible(markdown('appendix', { study }));
    const html = render(nestedSpec({ study }), 'appendix', 'html').content;
    if (!text.includes('\u202E') && !text.includes('&')) expect(page).toContain(text);
    expect(html).not.toMatch(/<script|<img|onerror=y>|href="javascript/);
    expect(html).not.toContain('<em>not bold</em>');
  });

  test('any title gives a page, the numbers of which do not change', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme', minLength: 1, maxLength: 60 }), (title) => {
        const { report, problems } = check(nestedSpec({ study: { title }, documents: [{ kind: 'grant' }] }));
        if (report === null) {
          expect(problems.length).toBeGreaterThan(0);
          return;
        }
        for (const { content } of renderAll(report)) expect(content).toContain('235');
      }),
      { numRuns: 60 },
    );
  });
});

describe('a study that cannot have enough people', () => {
  test('has documents that say so plainly, with what the smaller number buys', () => {
    const page = markdown('ethics', { sample: { maximum: 150, counts: 'invited' } });
    expect(page).toMatch(
      /At most 150 can be invited, which leaves 150 for the analysis: the study as specified is not feasible/,
    );
    expect(page).toMatch(/With the 150 that can be had at most, the power is \.\d{3}/);
    expect(page).toMatch(/smallest effect detectable with a power of \.90 is a partial R² of/);
  });
});

test('a spec that breaks a rule of level error gives no document', () => {
  expect(() => markdown('ethics', { criteria: { alpha: 0.95, power: 0.96 } })).toThrow(ProblemError);
});

test('rendering twice gives the same bytes, and does not change what was given', () => {
  const spec = nestedSpec();
  const before = structuredClone(spec);
  const once = render(spec, 'appendix', 'html').content;
  expect(render(spec, 'appendix', 'html').content).toBe(once);
  expect(spec).toEqual(before);
  expect(solve(spec).spec_hash).toHaveLength(64);
});
