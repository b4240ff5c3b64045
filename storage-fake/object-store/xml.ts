const NAMESPACE = "http://s3.amazonaws.com/doc/2006-03-01/";

/** One element to write: its name and its text, or its children in order. */
export type XmlNode = [name: string, content: string | number | XmlNode[]];

/** One element that was read. */
export interface XmlElement {
  name: string;
  text: string;
  children: XmlElement[];
}

/** Keys may hold control characters; S3 writes them as references. */
function escapeText(text: string): string {
  return text.replace(/[&<>"\u0000-\u001f]/g, (character) => `&#${character.charCodeAt(0)};`);
}

function renderNode([name, content]: XmlNode): string {
  const inner = Array.isArray(content)
    ? content.map(renderNode).join("")
    : escapeText(String(content));
  return `<${name}>${inner}</${name}>`;
}

export function renderXml(
  rootName: string,
  children: XmlNode[],
  { namespace = true }: { namespace?: boolean } = {},
): string {
  const inner = children.map(renderNode).join("");
  const attribute = namespace ? ` xmlns="${NAMESPACE}"` : "";
  return `<?xml version="1.0" encoding="UTF-8"?>\n<${rootName}${attribute}>${inner}</${rootName}>`;
}

const NAMED: Record<string, string> = { amp: "&", lt: "<", gt: ">", quot: '"', apos: "'" };

function unescapeText(text: string): string {
  return text.replace(/&(?:#x([0-9a-f]+)|#(\d+)|(\w+));/gi, (_whole, hex, decimal, name) => {
    if (typeof name === "string") {
      const known = NAMED[name];
      if (known === undefined) throw new SyntaxError(`Unknown reference &${name};`);
      return known;
    }
    return String.fromCodePoint(
      typeof hex === "string" ? Number.parseInt(hex, 16) : Number.parseInt(decimal, 10),
    );
  });
}

/**
 * Reads the small XML bodies that S3 clients send: elements and text, attributes ignored.
 * Document types, CDATA and processing instructions other than the declaration are refused.
 *
 * @throws SyntaxError when the text is not well formed.
 */
export function parseXml(source: string): XmlElement {
  const top: XmlElement = { name: "", text: "", children: [] };
  const open: XmlElement[] = [top];
  const body = source.replace(/^\uFEFF?\s*<\?xml[^>]*\?>/, "");
  const token = /<(\/?)([\w:.-]+)((?:\s+[\w:.-]+\s*=\s*(?:"[^"<]*"|'[^'<]*'))*)\s*(\/?)>|([^<]+)/y;
  while (token.lastIndex < body.length) {
    const found = token.exec(body);
    const current = open[open.length - 1];
    if (!found || !current) throw new SyntaxError("Unexpected character");
    const [, closing, name, , selfClosing, text] = found;
    if (text !== undefined) {
      current.text += unescapeText(text);
    } else if (closing) {
      if (current.name !== name || current === top) throw new SyntaxError("Unmatched end tag");
      open.pop();
    } else {
      const element: XmlElement = { name: name ?? "", text: "", children: [] };
      current.children.push(element);
      if (!selfClosing) open.push(element);
    }
  }
  const root = top.children[0];
  if (open.length !== 1 || top.children.length !== 1 || !root || top.text.trim() !== "") {
    throw new SyntaxError("Expected one root element");
  }
  return root;
}

export function childrenNamed(element: XmlElement, name: string): XmlElement[] {
  return element.children.filter((child) => child.name === name);
}

export function childText(element: XmlElement, name: string): string | undefined {
  return childrenNamed(element, name)[0]?.text;
}
