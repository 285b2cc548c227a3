import { type DefaultTreeAdapterTypes, parse } from 'parse5';

export type Element = DefaultTreeAdapterTypes.Element;
type Node = DefaultTreeAdapterTypes.Node;

function isElement(node: Node): node is Element {
  return 'tagName' in node;
}

function childrenOf(node: Node): readonly Node[] {
  return 'childNodes' in node ? node.childNodes : [];
}

/** A document as a browser reads it; any error of syntax is thrown. */
export function parsed(html: string): DefaultTreeAdapterTypes.Document {
  const errors: string[] = [];
  const tree = parse(html, {
    onParseError: ({ code, startLine, startCol }) => errors.push(`${code} ${startLine}:${startCol}`),
  });
  if (errors.length > 0) throw new Error(`not valid HTML: ${errors.slice(0, 5).join(', ')}`);
  return tree;
}

/** All elements below a node, in the order of the document. */
export function elementsOf(node: Node): readonly Element[] {
  return childrenOf(node).flatMap((child) => (isElement(child) ? [child, ...elementsOf(child)] : elementsOf(child)));
}

/** Value of an attribute. */
export function attributeOf({ attrs }: Element, wanted: string): string | undefined {
  return attrs.find(({ name }) => name === wanted)?.value;
}

/** Text below a node. */
export function textOf(node: Node): string {
  return 'value' in node ? node.value : childrenOf(node).map(textOf).join('');
}

/** An element by its id. */
export function byId(node: Node, id: string): Element {
  const found = elementsOf(node).find((each) => attributeOf(each, 'id') === id);
  if (found === undefined) throw new Error(`no element has the id ${id}`);
  return found;
}

/** Everything but texts: kinds of nodes, names, attributes, and how they lie in each other. */
export function shapeOf(node: Node, isUsers: (attribute: string) => boolean = () => false): string {
  const inner = childrenOf(node)
    .map((child) => shapeOf(child, isUsers))
    .join('');
  if (!isElement(node)) return node.nodeName === '#text' ? '' : `${node.nodeName}(${inner})`;
  const attributes = node.attrs.map(({ name, value }) => (isUsers(name) ? name : `${name}=${value}`));
  return `${node.namespaceURI.slice(-8)}:${node.tagName}[${attributes.join('|')}](${inner})`;
}
