import type { Reference } from '../../spec/study.ts';
export const apaEntry = (r: Reference) => r.id;
