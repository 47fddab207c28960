export const toHtml = (t: string, _f: ReadonlyMap<string, string>) => t;
