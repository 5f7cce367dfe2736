import { createHash } from "node:crypto";
import { once } from "node:events";
import { createWriteStream } from "node:fs";
import { crc32, deflateRawSync } from "node:zlib";
import ExcelJS from "exceljs";
import type { TextEncoding } from "@/modules/imports/model";

/** Files for tests of the importer, made by code. The oracle for workbooks is another library than the reader's. */

/** The signs of Windows-1252 between 0x80 and 0x9F. Source: Unicode Consortium, mapping table CP1252.TXT. */
const WINDOWS_1252_HIGH = "€\u0081‚ƒ„…†‡ˆ‰Š‹Œ\u008DŽ\u008F\u0090‘’“”•–—˜™š›œ\u009DžŸ";

/** Can this text be written in the encoding? */
export function isEncodable(text: string, encoding: TextEncoding): boolean {
  if (!text.isWellFormed() || text.includes("\0")) return false;
  return encoding !== "windows-1252" || [...text].every((sign) => windows1252Byte(sign) !== null);
}

function windows1252Byte(sign: string): number | null {
  const code = sign.codePointAt(0) ?? 0;
  if (code < 0x80 || (code >= 0xa0 && code <= 0xff)) return code;
  const high = WINDOWS_1252_HIGH.indexOf(sign);
  return high < 0 ? null : 0x80 + high;
}

/** The bytes of a text in an encoding, with or without its byte order mark. */
export function encodeText(text: string, encoding: TextEncoding, withBom = false): Buffer {
  if (encoding === "windows-1252") return Buffer.from([...text].map((sign) => windows1252Byte(sign) ?? 0x3f));
  const marked = withBom ? `\uFEFF${text}` : text;
  if (encoding === "utf-8") return Buffer.from(marked, "utf8");
  const little = Buffer.from(marked, "utf16le");
  return encoding === "utf-16le" ? little : little.swap16();
}

export const sha256 = (bytes: Buffer): string => createHash("sha256").update(bytes).digest("hex");

/** One part of an archive. `declaredSize` lets it lie about what it unpacks to. */
export type ZipPart = {
  name: string;
  data: Buffer | string;
  declaredSize?: number;
  stored?: boolean;
  encrypted?: boolean;
};

/** A zip archive, byte for byte (APPNOTE.TXT 4.3.7, 4.3.12, 4.3.16), so that it can be made wrong on purpose. */
export function zip(parts: ZipPart[]): Buffer {
  const bodies: Buffer[] = [];
  const directory: Buffer[] = [];
  let offset = 0;
  for (const part of parts) {
    const data = Buffer.from(part.data as string);
    const packed = part.stored ? data : deflateRawSync(data);
    const name = Buffer.from(part.name);
    const fields = Buffer.alloc(26);
    fields.writeUInt16LE(20, 0);
    fields.writeUInt16LE(part.encrypted ? 1 : 0, 2);
    fields.writeUInt16LE(part.stored ? 0 : 8, 4);
    fields.writeUInt32LE(crc32(data), 10);
    fields.writeUInt32LE(packed.length, 14);
    fields.writeUInt32LE(part.declaredSize ?? data.length, 18);
    fields.writeUInt16LE(name.length, 22);
    bodies.push(Buffer.from("504b0304", "hex"), fields, name, packed);
    const where = Buffer.alloc(14);
    where.writeUInt32LE(offset, 10);
    directory.push(Buffer.from("504b01021400", "hex"), fields, where, name);
    offset += 30 + name.length + packed.length;
  }
  const listed = Buffer.concat(directory);
  const end = Buffer.alloc(22);
  end.writeUInt32LE(0x06054b50, 0);
  end.writeUInt16LE(parts.length, 8);
  end.writeUInt16LE(parts.length, 10);
  end.writeUInt32LE(listed.length, 12);
  end.writeUInt32LE(offset, 16);
  return Buffer.concat([...bodies, listed, end]);
}

const RELS = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";
const MAIN = "http://schemas.openxmlformats.org/spreadsheetml/2006/main";

/** The least a workbook needs, around the rows of one worksheet as XML; `more` replaces or adds parts. */
export function bareWorkbook(sheetData: string, more: ZipPart[] = [], workbookPr = ""): ZipPart[] {
  const parts: ZipPart[] = [
    {
      name: "_rels/.rels",
      data: `<Relationships><Relationship Id="r1" Type="${RELS}/officeDocument" Target="xl/workbook.xml"/></Relationships>`,
    },
    {
      name: "xl/workbook.xml",
      data: `<workbook xmlns="${MAIN}" xmlns:r="${RELS}">${workbookPr}<sheets><sheet name="Data" sheetId="1" r:id="r1"/></sheets></workbook>`,
    },
    {
      name: "xl/_rels/workbook.xml.rels",
      data: `<Relationships><Relationship Id="r1" Type="${RELS}/worksheet" Target="worksheets/sheet1.xml"/></Relationships>`,
    },
    {
      name: "xl/worksheets/sheet1.xml",
      data: `<worksheet xmlns="${MAIN}"><sheetData>${sheetData}</sheetData></worksheet>`,
    },
  ];
  return [...parts.filter((part) => !more.some((other) => other.name === part.name)), ...more];
}

/** A row of texts as worksheet XML. */
export const xmlRow = (line: number, ...texts: string[]): string =>
  `<row r="${line}">${texts.map((text) => `<c t="inlineStr"><is><t>${text}</t></is></c>`).join("")}</row>`;

export type WorkbookCell =
  | string
  | number
  | boolean
  | Date
  | null
  | { formula: string; result?: number | string };

/** A workbook written by a library for workbooks. Dates are UTC fields of a Date, shown as date and time. */
export async function workbook(
  rows: WorkbookCell[][],
  options: { date1904?: boolean; sheet?: string } = {},
): Promise<Buffer> {
  const book = new ExcelJS.Workbook();
  book.properties.date1904 = options.date1904 ?? false;
  const sheet = book.addWorksheet(options.sheet ?? "Readings");
  for (const cells of rows) {
    const row = sheet.addRow(cells);
    row.eachCell((cell) => {
      if (cell.value instanceof Date) cell.numFmt = "dd/mm/yyyy hh:mm";
    });
  }
  return Buffer.from(await book.xlsx.writeBuffer());
}

/** A text file of one line of the given length, written in pieces. */
export async function writeLongLine(path: string, head: string, bytes: number): Promise<void> {
  const out = createWriteStream(path);
  out.write(head);
  const piece = "x".repeat(1024 * 1024);
  for (let written = 0; written < bytes; written += piece.length) {
    if (!out.write(piece)) await once(out, "drain");
  }
  await new Promise<void>((resolve, reject) =>
    out.end((error?: Error | null) => (error ? reject(error) : resolve())),
  );
}
