import { XMLParser, XMLValidator } from 'fast-xml-parser';
import { S3Error } from './errors.ts';

/** Namespace of S3's answers, from the API's schema. */
const NAMESPACE = 'http://s3.amazonaws.com/doc/2006-03-01/';

/** A finished piece of XML, kept apart from text so that nothing is escaped twice or not at all. */
export type Xml = { readonly xml: string };

/** One element holding escaped text, a number or flag, or other elements. */
export function element(name: string, content: string | number | boolean | readonly Xml[]): Xml {
  const inner =
    typeof content === 'object' ? content.map((child) => child.xml).join('') : escapeText(String(content));
  return { xml: `<${name}>${inner}</${name}>` };
}

/** An element only when there is a value; for the many optional fields of S3's answers. */
export function optionalElement(name: string, content: string | number | undefined): readonly Xml[] {
  return content === undefined ? [] : [element(name, content)];
}

/** The XML body of a refusal: code, message, details, the path asked for and the request's id. */
export function errorDocument(error: S3Error, resource: string, requestId: string): string {
  const details = Object.entries(error.details).map(([name, value]) => element(name, value));
  return xmlDocument(
    element('Error', [
      element('Code', error.code),
      element('Message', error.message),
      ...details,
      element('Resource', resource),
      element('RequestId', requestId),
    ]),
  );
}

function xmlDocument(root: Xml): string {
  return `<?xml version="1.0" encoding="UTF-8"?>\n${root.xml}`;
}

/** A result document: root element of the given name in S3's namespace. */
export function resultDocument(name: string, children: readonly Xml[]): string {
  const inner = children.map((child) => child.xml).join('');
  return xmlDocument({ xml: `<${name} xmlns="${NAMESPACE}">${inner}</${name}>` });
}

function escapeText(text: string): string {
  return (
    text
      .replaceAll('&', '&amp;')
      .replaceAll('<', '&lt;')
      .replaceAll('>', '&gt;')
      .replaceAll('"', '&quot;')
      // A parser would turn a bare carriage return into a line feed and so change a key.
      // eslint-disable-next-line no-control-regex
      .replace(/[\u0000-\u001f\u007f]/g, (char) => `&#x${char.charCodeAt(0).toString(16).toUpperCase()};`)
  );
}

const parser = new XMLParser({
  ignoreAttributes: true,
  ignoreDeclaration: true,
  parseTagValue: false,
  trimValues: false,
  // The parser reads numbered references, as Go's clients write quotes, only together with HTML's names.
  htmlEntities: true,
  removeNSPrefix: true,
  isArray: (name) => name === 'Part' || name === 'Object',
});

/**
 * The children of a request body's root element, as nested objects of strings (`Part` and `Object` always arrays).
 * Throws MalformedXML for anything else, a document type included.
 */
export function parseXml(body: string, rootName: string): Record<string, unknown> {
  const malformed = new S3Error(
    'MalformedXML',
    'The XML you provided was not well-formed or did not validate against our published schema',
  );
  if (body.includes('<!DOCTYPE') || XMLValidator.validate(body) !== true) throw malformed;
  let root: unknown;
  try {
    root = (parser.parse(body) as Record<string, unknown>)[rootName];
  } catch {
    throw malformed;
  }
  if (typeof root !== 'object' || root === null) throw malformed;
  return root as Record<string, unknown>;
}
