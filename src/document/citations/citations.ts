import type { CitationStyle, Reference } from '../../spec/study.ts';
export class CitationLog {
  private used: string[] = [];
  references: ReadonlyMap<string, Reference>;
  constructor(_style: CitationStyle, references: ReadonlyMap<string, Reference>) {
    this.references = references;
  }
  cite(keys: readonly string[], form: 'parenthetical' | 'bare' | 'narrative'): string {
    if (keys.length === 0) return '';
    for (const k of keys) if (!this.used.includes(k)) this.used.push(k);
    const t = keys.map((k) => `${k}${this.references.has(k) ? '' : '?'}`).join('; ');
    return form === 'parenthetical' ? ` (${t})` : t;
  }
  list(): string[] {
    return this.used.map((k) => `${k}.`);
  }
}
