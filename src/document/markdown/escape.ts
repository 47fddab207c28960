export const escapeMarkdown = (t: string) => t;
