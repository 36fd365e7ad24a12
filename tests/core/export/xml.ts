/** A strict reader for the small part of XML that drawings use; throws at the first thing that is not well formed. */
export interface XmlElement {
  readonly name: string;
  readonly attributes: Readonly<Record<string, string>>;
  readonly children: (XmlElement | string)[];
}

const ENTITY = /&(?:amp|lt|gt|quot|#\d+);/g;
const TAG = /^<([A-Za-z][\w:.-]*)((?:\s+[A-Za-z_:][\w:.-]*="[^"<]*")*)\s*(\/?)>/;

export function readXml(source: string): XmlElement {
  if (/[^\t\n\r\u0020-\ud7ff\ue000-\ufffd\u{10000}-\u{10ffff}]/u.test(source))
    throw new Error('a character XML does not allow');
  const declaration = '<?xml version="1.0" encoding="UTF-8"?>\n';
  if (!source.startsWith(declaration)) throw new Error('no declaration');
  let rest = source.slice(declaration.length);
  const top: XmlElement = { name: '', attributes: {}, children: [] };
  const open = [top];
  while (rest !== '') {
    const inside = open.at(-1)!;
    if (rest.startsWith('</')) {
      const end = rest.indexOf('>');
      if (rest.slice(2, end) !== inside.name) throw new Error(`${rest.slice(0, end + 1)} closes ${inside.name}`);
      open.pop();
      rest = rest.slice(end + 1);
    } else if (rest.startsWith('<')) {
      const tag = TAG.exec(rest);
      if (tag === null) throw new Error(`not a tag: ${rest.slice(0, 80)}`);
      const [whole, name = '', attributes = '', closed] = tag;
      const element: XmlElement = { name, attributes: readAttributes(attributes), children: [] };
      inside.children.push(element);
      if (closed === '') open.push(element);
      rest = rest.slice(whole.length);
    } else {
      const end = rest.indexOf('<');
      const text = end < 0 ? rest : rest.slice(0, end);
      inside.children.push(unescaped(text));
      rest = rest.slice(text.length);
    }
  }
  if (open.length !== 1) throw new Error(`${open.at(-1)!.name} is not closed`);
  const [root, ...others] = top.children.filter((child) => typeof child !== 'string' || child.trim() !== '');
  if (root === undefined || typeof root === 'string' || others.length > 0) throw new Error('not one root');
  return root;
}

function readAttributes(source: string): Record<string, string> {
  const attributes: Record<string, string> = {};
  for (const [, name = '', value = ''] of source.matchAll(/([A-Za-z_:][\w:.-]*)="([^"]*)"/g)) {
    if (name in attributes) throw new Error(`${name} twice`);
    attributes[name] = unescaped(value);
  }
  return attributes;
}

function unescaped(text: string): string {
  if (text.replace(ENTITY, '').includes('&')) throw new Error(`a bare & in ${text.slice(0, 80)}`);
  return text.replace(/&(amp|lt|gt|quot|#(\d+));/g, (_, name: string, code?: string) =>
    code === undefined ? { amp: '&', lt: '<', gt: '>', quot: '"' }[name]! : String.fromCodePoint(Number(code)),
  );
}

export function elements(root: XmlElement, name: string): XmlElement[] {
  const found = root.name === name ? [root] : [];
  return [...found, ...root.children.flatMap((child) => (typeof child === 'string' ? [] : elements(child, name)))];
}

export const textOf = (element: XmlElement): string =>
  element.children.map((child) => (typeof child === 'string' ? child : textOf(child))).join('');
