/** Reads HTML as strictly as XML: every element closed, every attribute quoted, nothing for a browser to repair. */

export interface HtmlElement {
  name: string;
  attributes: ReadonlyMap<string, string>;
  children: (HtmlElement | string)[];
}

const VOID = new Set(['br', 'hr', 'img', 'link', 'meta']);
const RAW = new Set(['style', 'title']);
const TAG = /<(\/?)([a-zA-Z][\w-]*)((?:\s+[\w:-]+="[^"<]*")*)\s*(\/?)>/y;

/** The html element. @throws {Error} names what is wrong, and the text around it */
export function parseStrictly(html: string): HtmlElement {
  const start = '<!doctype html>\n';
  if (!html.startsWith(start)) throw new Error('the page does not begin with <!doctype html>');
  const root: HtmlElement = { name: '#document', attributes: new Map(), children: [] };
  const open = [root];
  let at = start.length;
  const wrong = (what: string): never => {
    throw new Error(`${what} at: ${html.slice(at, at + 80)}`);
  };
  while (at < html.length) {
    const parent = open.at(-1) ?? root;
    if (html[at] !== '<') {
      const end = html.indexOf('<', at);
      const text = html.slice(at, end < 0 ? undefined : end);
      if (/&(?!(?:amp|lt|gt|quot|nbsp|#\d+|#x[\da-f]+);)/i.test(text) && parent.name !== 'style') {
        wrong('bare ampersand');
      }
      if (text.includes('>') && parent.name !== 'style') wrong('bare >');
      parent.children.push(text);
      at += text.length;
      continue;
    }
    TAG.lastIndex = at;
    const [whole, slash, name = '', written = '', selfClosing] = TAG.exec(html) ?? wrong('not a tag');
    if (slash === '/') {
      if (parent.name !== name) wrong(`</${name}> closes <${parent.name}>`);
      open.pop();
    } else {
      const element: HtmlElement = { name, attributes: attributesOf(written, wrong), children: [] };
      parent.children.push(element);
      const isSvg = name === 'svg' || open.some((one) => one.name === 'svg');
      if (selfClosing === '/' && !isSvg) wrong(`<${name}/> is not closed in HTML`);
      if (selfClosing !== '/' && !VOID.has(name)) open.push(element);
      if (RAW.has(name) && !isSvg) {
        const end = html.indexOf(`</${name}>`, at);
        element.children.push(html.slice(at + whole.length, end));
        open.pop();
        at = end + name.length + 3;
        continue;
      }
    }
    at += whole.length;
  }
  if (open.length !== 1) wrong(`<${open.at(-1)?.name}> is not closed`);
  const elements = root.children.filter((child) => typeof child !== 'string');
  const [only] = elements;
  if (elements.length !== 1 || only?.name !== 'html') throw new Error('the page is not one html element');
  return only;
}

function attributesOf(written: string, wrong: (what: string) => never): Map<string, string> {
  const attributes = new Map<string, string>();
  for (const [, name = '', value = ''] of written.matchAll(/([\w:-]+)="([^"]*)"/g)) {
    if (attributes.has(name)) wrong(`attribute ${name} twice`);
    attributes.set(name, value);
  }
  return attributes;
}

/** Every element below, with its ancestors from the root. */
export function* walk(
  element: HtmlElement,
  above: readonly HtmlElement[] = [],
): Generator<{ element: HtmlElement; above: readonly HtmlElement[] }> {
  yield { element, above };
  for (const child of element.children) {
    if (typeof child !== 'string') yield* walk(child, [...above, element]);
  }
}

export function textOf({ children }: HtmlElement): string {
  return children.map((child) => (typeof child === 'string' ? child : textOf(child))).join('');
}

/** Tags in order, attributes included: what a browser's own serialisation must agree with. */
export function tagsOf(element: HtmlElement): string[] {
  return [...walk(element)].map(({ element: { name, attributes }, above }) =>
    [above.length, name, ...[...attributes].map(([key, value]) => `${key}="${value}"`)].join(' '),
  );
}
