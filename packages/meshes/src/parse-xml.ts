import sax from 'sax';
import { MeshError, type Refuse } from './mesh-error.js';

/** The part of the standard decoder that is used: this package builds without the types of any platform. */
declare const TextDecoder: new (
  label: string,
  options: { fatal: boolean },
) => { decode(bytes?: Uint8Array, options?: { stream: boolean }): string };

/** Only the five entities of XML itself; sax knows this option, its published types do not. */
const STRICT = { strictEntities: true } as sax.SAXOptions;

export interface XmlHandlers {
  readonly onOpen: (name: string, attributes: Readonly<Record<string, string>>, depth: number) => void;
  readonly onClose?: (name: string, depth: number) => void;
}

export interface XmlParser {
  readonly write: (piece: Uint8Array) => void;
  readonly end: () => void;
}

/**
 * Parses UTF-8 XML as it comes. A DOCTYPE is refused before anything in it is looked at, so no entity is
 * ever declared, expanded or fetched (3MF core specification 1.3, 2.3.2: no DTD, UTF-8 or UTF-16; UTF-16 is
 * refused here, since no exporter of note writes it and readers differ on it).
 *
 * @throws MeshError `bad-encoding`, `doctype-forbidden`, `bad-xml`.
 */
export function openXmlParser(partName: string, handlers: XmlHandlers, refuse: Refuse): XmlParser {
  const decoder = new TextDecoder('utf-8', { fatal: true });
  const parser = sax.parser(true, STRICT);
  let depth = 0;
  let hasRoot = false;
  const badXml = (detail: string): MeshError =>
    refuse('bad-xml', `is damaged: “${partName}” is not well-formed XML (${detail}). Export it again.`);

  parser.onopentag = (tag) => {
    if (depth === 0 && hasRoot) throw badXml('more than one root element');
    hasRoot = true;
    handlers.onOpen(tag.name, tag.attributes as Record<string, string>, depth);
    depth += 1;
  };
  parser.onclosetag = (name) => {
    depth -= 1;
    handlers.onClose?.(name, depth);
  };
  const refuseDoctype = (): void => {
    throw refuse(
      'doctype-forbidden',
      `is refused: “${partName}” declares a document type (DOCTYPE), which 3MF forbids. Export it again.`,
    );
  };
  parser.ondoctype = refuseDoctype;
  parser.onprocessinginstruction = ({ name, body }) => {
    const encoding = /encoding\s*=\s*["']([^"']*)["']/.exec(body)?.[1];
    if (name === 'xml' && encoding !== undefined && encoding.toLowerCase() !== 'utf-8') {
      throw refuse('bad-encoding', `is refused: “${partName}” is written in ${encoding}; save it as UTF-8.`);
    }
  };
  parser.onerror = (error) => {
    throw badXml(error.message.split('\n')[0] ?? 'unreadable');
  };

  let isFirst = true;
  const feed = (piece: Uint8Array | undefined): void => {
    let text: string;
    try {
      text = piece === undefined ? decoder.decode() : decoder.decode(piece, { stream: true });
    } catch {
      throw refuse('bad-encoding', `is refused: “${partName}” is not UTF-8 text. Save it as UTF-8.`);
    }
    // sax collects a whole DOCTYPE before it reports it; the first piece shows it sooner.
    if (isFirst && /<!DOCTYPE/i.test(text)) refuseDoctype();
    if (isFirst && text.includes('\0')) {
      throw refuse('bad-encoding', `is refused: “${partName}” is not UTF-8 text. Save it as UTF-8.`);
    }
    if (text !== '') isFirst = false;
    parser.write(text);
  };
  return {
    write: feed,
    end: () => {
      feed(undefined);
      parser.close();
      if (!hasRoot) throw badXml('no root element');
    },
  };
}
