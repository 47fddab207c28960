import type { Reference } from '../spec/study.ts';
export const sources: Reference[] = [];
export function source(key: string): Reference { return sources.find((s) => s.id === key) ?? { id: key, type: 'book' }; }
