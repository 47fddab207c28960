export const countWords = (t: string) => t.split(/\s+/).length;
