import { StringDecoder } from 'node:string_decoder';
import { SaxesParser } from 'saxes';

export interface XmlHandlers {
  /** Local names: the prefix is left out, so that strict and transitional files read alike. */
  open?: (name: string, attributes: Record<string, string>) => void;
  text?: (text: string) => void;
  close?: (name: string) => void;
}

export interface XmlSink {
  write(chunk: Buffer): void;
  end(): void;
}

/** A push parser: memory stays flat however large the part is. Entities of a DTD are never expanded. */
export function xmlSink(handlers: XmlHandlers): XmlSink {
  const parser = new SaxesParser();
  const decoder = new StringDecoder('utf8');
  parser.on('error', (error) => {
    throw error;
  });
  if (handlers.open) {
    const { open } = handlers;
    parser.on('opentag', (tag) => open(localName(tag.name), tag.attributes));
  }
  if (handlers.text) {
    parser.on('text', handlers.text);
    parser.on('cdata', handlers.text);
  }
  if (handlers.close) {
    const { close } = handlers;
    parser.on('closetag', (tag) => close(localName(tag.name)));
  }
  return {
    write: (chunk) => {
      parser.write(decoder.write(chunk));
    },
    end: () => {
      parser.write(decoder.end());
      parser.close();
    },
  };
}

/** An attribute by its local name, `r:id` or `id`. */
export function attributeOf(attributes: Record<string, string>, name: string): string | undefined {
  if (attributes[name] !== undefined) return attributes[name];
  const prefixed = Object.keys(attributes).find((key) => key.endsWith(`:${name}`));
  return prefixed === undefined ? undefined : attributes[prefixed];
}

export function isTrue(value: string | undefined): boolean {
  return value === '1' || value === 'true' || value === 'on';
}

function localName(name: string): string {
  const colon = name.indexOf(':');
  return colon < 0 ? name : name.slice(colon + 1);
}
