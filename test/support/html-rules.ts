/** What a page must keep to beyond being well formed: known elements and attributes, unique ids, one main, headings in
 *  order, nothing interactive inside another, nothing that runs or loads. Elements and content models after the HTML
 *  standard, as far as our pages use it. */

import { type HtmlElement, textOf, walk } from './html-tree.ts';

const GLOBAL = ['id', 'class', 'lang', 'dir', 'role', 'tabindex', 'aria-label', 'aria-labelledby'];
const ELEMENTS: Readonly<Record<string, readonly string[]>> = {
  html: [],
  head: [],
  meta: ['charset', 'name', 'content', 'http-equiv'],
  title: [],
  style: [],
  body: [],
  ...Object.fromEntries(
    'header main footer h1 h2 h3 h4 p ul li div table caption thead tbody tr figure figcaption strong em code pre blockquote hr br s'
      .split(' ')
      .map((name) => [name, []]),
  ),
  ol: ['start'],
  td: ['scope'],
  th: ['scope'],
  a: ['href', 'title'],
  img: ['src', 'alt'],
};
const PHRASING = new Set(['a', 'strong', 'em', 'code', 's', 'br', 'img', 'svg']);
const ONLY_PHRASING = new Set([
  'p',
  'h1',
  'h2',
  'h3',
  'h4',
  'caption',
  'figcaption',
  'strong',
  'em',
  'a',
  's',
]);
const SVG_ELEMENTS = new Set(
  'svg title desc g defs clipPath pattern path line rect circle text tspan polyline polygon'.split(' '),
);
/** Presentation attributes and geometry; none of them runs, loads or is style as text. */
const SVG_ATTRIBUTES =
  /^(?:id|xmlns|viewBox|width|height|role|aria-labelledby|direction|d|x|y|x1|y1|x2|y2|cx|cy|r|rx|dx|dy|points|transform|patternUnits|clip-path|fill(?:-opacity)?|stroke(?:-\w+)?|opacity|font-(?:family|size|weight|style)|text-anchor|dominant-baseline)$/;
const INTERACTIVE = new Set(['a', 'button', 'input', 'select', 'textarea']);

/** Sentences, one a breach; empty for a good page. */
export function breachesOf(html: HtmlElement): string[] {
  const all = [...walk(html)];
  const breaches: string[] = [];
  const ids = new Set<string>();
  for (const { element, above } of all) {
    const { name, attributes } = element;
    const place = `<${name}> below ${above.map((one) => one.name).join(' ')}`;
    const isSvg = name === 'svg' || above.some((one) => one.name === 'svg');
    const known = isSvg ? SVG_ELEMENTS.has(name) : name in ELEMENTS;
    if (!known) breaches.push(`unknown element ${place}`);
    for (const [key, value] of attributes) {
      const allowed = isSvg ? SVG_ATTRIBUTES.test(key) : [...GLOBAL, ...(ELEMENTS[name] ?? [])].includes(key);
      if (!allowed) breaches.push(`attribute ${key} of ${place}`);
      if (key === 'href' && !/^(?:https?:\/\/|#)/.test(value)) breaches.push(`link to ${value}`);
      if (key === 'src' && !value.startsWith('data:')) breaches.push(`image from ${value}`);
      if (/url\((?!#)/.test(value)) breaches.push(`address in ${key} of ${place}`);
    }
    const id = attributes.get('id');
    if (id !== undefined && (ids.has(id) || /\s/.test(id) || id === ''))
      breaches.push(`id '${id}' twice or blank`);
    if (id !== undefined) ids.add(id);
    const parent = above.at(-1);
    if (!isSvg && parent !== undefined && ONLY_PHRASING.has(parent.name) && !PHRASING.has(name)) {
      breaches.push(`${place}: only phrasing content is allowed there`);
    }
    if (INTERACTIVE.has(name) && above.some((one) => INTERACTIVE.has(one.name)))
      breaches.push(`nested ${place}`);
    if (name === 'img' && !attributes.has('alt')) breaches.push(`no alt: ${place}`);
  }
  for (const { element } of all) {
    for (const target of element.attributes.get('aria-labelledby')?.split(' ') ?? []) {
      if (!ids.has(target)) breaches.push(`aria-labelledby names '${target}', which is not there`);
    }
  }
  for (const once of ['head', 'title', 'body', 'header', 'main', 'footer', 'h1']) {
    const count = all.filter(
      ({ element, above }) => element.name === once && !above.some((one) => one.name === 'svg'),
    ).length;
    if (count !== 1) breaches.push(`${count} × <${once}>`);
  }
  if (!html.attributes.get('lang')) breaches.push('no language');
  return [...breaches, ...headingBreaches(all.map(({ element }) => element)), ...tableBreaches(html)];
}

function headingBreaches(elements: readonly HtmlElement[]): string[] {
  const headings = elements.filter(({ name }) => /^h[1-6]$/.test(name));
  return headings.flatMap((heading, index) => {
    const [level, before] = [Number(heading.name[1]), Number(headings[index - 1]?.name[1] ?? 0)];
    const empty = textOf(heading).trim() === '' ? [`empty <${heading.name}>`] : [];
    return level > before + 1 ? [...empty, `<${heading.name}> after level ${before}`] : empty;
  });
}

/** Rows of one table have the same number of cells. */
function tableBreaches(html: HtmlElement): string[] {
  return [...walk(html)]
    .filter(({ element }) => element.name === 'table')
    .flatMap(({ element: table }) => {
      const widths = [...walk(table)]
        .filter(({ element }) => element.name === 'tr')
        .map(({ element }) => element.children.filter((child) => typeof child !== 'string').length);
      return new Set(widths).size > 1 ? [`rows of ${widths.join(', ')} cells in one table`] : [];
    });
}
