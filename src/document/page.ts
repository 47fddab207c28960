export const renderPage = (p: { title: string; kind: string; bodyHtml: string }) => p.bodyHtml;
