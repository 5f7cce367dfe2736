import { SaxesParser, type SaxesTagPlain } from "saxes";
import { damaged } from "@/modules/imports/reader/zip-guard";
import { RefusedFile } from "@/modules/imports/rules/refused-file";

/** What is told about each element; names come without their namespace prefix. */
export type XmlHandler = {
  open?: (name: string, attributes: Record<string, string>) => void;
  close?: (name: string) => void;
  text?: (text: string) => void;
};

/** Characters without any element in between; no cell or setting is that long. */
const MAX_TEXT_CHARS = 4 * 1024 * 1024;

const local = (name: string): string => name.slice(name.indexOf(":") + 1);

/**
 * Feeds the XML of one workbook part to `handler`, piece by piece, and yields after each piece so that rows can be
 * handed on. Letters cut between two pieces are put together. Document types (entities) are refused.
 * @throws RefusedFile when it is no well-formed XML in UTF-8
 */
export async function* readXml(
  pieces: AsyncIterable<Buffer>,
  handler: XmlHandler,
): AsyncGenerator<undefined> {
  const parser = new SaxesParser({ xmlns: false, position: false });
  const decoder = new TextDecoder("utf-8", { fatal: true });
  let sinceElement = 0;
  parser.on("opentag", (tag: SaxesTagPlain) => {
    sinceElement = 0;
    handler.open?.(local(tag.name), tag.attributes);
  });
  parser.on("closetag", (tag: SaxesTagPlain) => {
    sinceElement = 0;
    handler.close?.(local(tag.name));
  });
  if (handler.text) parser.on("text", handler.text);
  if (handler.text) parser.on("cdata", handler.text);
  parser.on("doctype", () => {
    throw damaged("it defines entities of its own");
  });
  parser.on("error", (cause) => {
    throw damaged(`its XML is faulty (${cause.message.slice(0, 80)})`);
  });
  const write = (text: string) => {
    sinceElement += text.length;
    if (sinceElement > MAX_TEXT_CHARS + text.length)
      throw damaged("a single cell holds millions of characters");
    parser.write(text);
  };
  try {
    for await (const piece of pieces) {
      write(decoder.decode(piece, { stream: true }));
      yield;
    }
    write(decoder.decode());
    parser.close();
    yield;
  } catch (cause) {
    if (cause instanceof RefusedFile || !(cause instanceof TypeError)) throw cause;
    throw damaged("its text is not in UTF-8");
  }
}

/** Reads a small part from end to end. */
export async function readWholeXml(pieces: AsyncIterable<Buffer>, handler: XmlHandler): Promise<void> {
  for await (const _ of readXml(pieces, handler));
}
