import type { DateStyle, SerialEpoch } from "@/modules/imports/model";
import { macroWorkbook } from "@/modules/imports/reader/file-kind";
import { readWholeXml } from "@/modules/imports/reader/read-xml";
import { damaged, type GuardedZip } from "@/modules/imports/reader/zip-guard";
import { refuseFile } from "@/modules/imports/rules/refused-file";

/** A worksheet by the name people see, and the part it stands in. */
export type SheetPart = { name: string; part: string; isHidden: boolean };

export type WorkbookParts = {
  sheets: SheetPart[];
  serialEpoch: SerialEpoch;
  sharedStrings: string[];
  /** For each cell style: does it show a date, a time, or neither? */
  dateStyles: DateStyle[];
};

type Relation = { id: string; type: string; target: string };

/** "xl/workbook.xml" + "worksheets/sheet1.xml" → "xl/worksheets/sheet1.xml" (ECMA-376 part 2, relative references). */
function resolveTarget(from: string, target: string): string {
  if (target.startsWith("/")) return target.slice(1);
  const path = from.split("/").slice(0, -1);
  for (const step of target.split("/")) {
    if (step === "..") path.pop();
    else if (step !== ".") path.push(step);
  }
  return path.join("/");
}

async function relationsOf(zip: GuardedZip, part: string): Promise<Relation[]> {
  const slash = part.lastIndexOf("/");
  const rels = `${part.slice(0, slash + 1)}_rels/${part.slice(slash + 1)}.rels`;
  const relations: Relation[] = [];
  if (!zip.has(rels)) return relations;
  await readWholeXml(zip.read(rels), {
    open: (name, { Id = "", Type = "", Target = "" }) => {
      if (name === "Relationship")
        relations.push({ id: Id, type: Type, target: resolveTarget(part, Target) });
    },
  });
  return relations;
}

const ofType = (relations: Relation[], type: string): Relation | undefined =>
  relations.find((relation) => relation.type.endsWith(`/${type}`));

async function refuseMacros(zip: GuardedZip): Promise<void> {
  if (zip.names().some((name) => /vbaproject\.bin$/i.test(name))) throw macroWorkbook();
  if (!zip.has("[Content_Types].xml")) return;
  let hasMacros = false;
  await readWholeXml(zip.read("[Content_Types].xml"), {
    open: (_, { ContentType = "" }) => {
      hasMacros ||= /macroEnabled|vbaProject/i.test(ContentType);
    },
  });
  if (hasMacros) throw macroWorkbook();
}

/** Number formats that are dates or times without a format code in the file. Source: ECMA-376 part 1, 18.8.30. */
function builtInStyle(id: number): DateStyle {
  if ((id >= 18 && id <= 22) || id === 32 || id === 33 || (id >= 45 && id <= 47) || id === 55 || id === 56)
    return "time";
  return (id >= 14 && id <= 17) || (id >= 27 && id <= 36) || (id >= 50 && id <= 58) ? "day" : null;
}

/** Does a format code show a date or a time? Quoted text, escapes, colours and locales count for nothing. */
export function dateStyleOf(code: string): DateStyle {
  const bare = (code.split(";")[0] ?? "")
    .replace(/"[^"]*"|\\.|_.|\*./g, "")
    .replace(/\[(?![hms]+\])[^\]]*\]/gi, "");
  if (/general/i.test(bare)) return null;
  if (/[hs]/i.test(bare)) return "time";
  return /[ymd]/i.test(bare) ? "day" : null;
}

async function readDateStyles(zip: GuardedZip, part: string | undefined): Promise<DateStyle[]> {
  const codes = new Map<number, string>();
  const styles: DateStyle[] = [];
  let isInCells = false;
  if (!part || !zip.has(part)) return styles;
  await readWholeXml(zip.read(part), {
    open: (name, attributes) => {
      if (name === "numFmt") codes.set(Number(attributes.numFmtId), attributes.formatCode ?? "");
      if (name === "cellXfs") isInCells = true;
      if (name !== "xf" || !isInCells) return;
      const id = Number(attributes.numFmtId ?? 0);
      const code = codes.get(id);
      styles.push(code === undefined ? builtInStyle(id) : dateStyleOf(code));
    },
    close: (name) => {
      if (name === "cellXfs") isInCells = false;
    },
  });
  return styles;
}

async function readSharedStrings(zip: GuardedZip, part: string | undefined): Promise<string[]> {
  const strings: string[] = [];
  let text = "";
  let isText = false;
  let phonetic = 0;
  if (!part || !zip.has(part)) return strings;
  await readWholeXml(zip.read(part), {
    open: (name) => {
      if (name === "si") text = "";
      if (name === "rPh") phonetic += 1;
      isText = name === "t" && phonetic === 0;
    },
    text: (piece) => {
      if (isText) text += piece;
    },
    close: (name) => {
      if (name === "t") isText = false;
      if (name === "rPh") phonetic -= 1;
      if (name === "si") strings.push(decodeEscapes(text));
    },
  });
  return strings;
}

/** `_x000D_` stands for a sign that XML cannot hold (ECMA-376 part 1, 22.9.2.19). */
export function decodeEscapes(text: string): string {
  if (!text.includes("_x")) return text;
  return text.replace(/_x([0-9A-Fa-f]{4})_/g, (_, code: string) =>
    String.fromCharCode(Number.parseInt(code, 16)),
  );
}

async function readSheets(zip: GuardedZip, workbook: string, relations: Relation[]) {
  const sheets: SheetPart[] = [];
  let serialEpoch: SerialEpoch = 1900;
  await readWholeXml(zip.read(workbook), {
    open: (name, attributes) => {
      if (name === "workbookPr") serialEpoch = isTrue(attributes.date1904) ? 1904 : 1900;
      if (name !== "sheet") return;
      const id = attributes["r:id"] ?? Object.entries(attributes).find(([key]) => key.endsWith(":id"))?.[1];
      const relation = relations.find((each) => each.id === id && each.type.endsWith("/worksheet"));
      const isHidden = attributes.state === "hidden" || attributes.state === "veryHidden";
      if (relation) sheets.push({ name: attributes.name ?? "", part: relation.target, isHidden });
    },
  });
  return { sheets, serialEpoch };
}

const isTrue = (text: string | undefined): boolean => text === "1" || text === "true";

/** Everything of a workbook that must be known before its rows can be read. @throws RefusedFile */
export async function readWorkbookParts(zip: GuardedZip): Promise<WorkbookParts> {
  await refuseMacros(zip);
  const root = (await relationsOf(zip, "")).find((relation) => relation.type.endsWith("/officeDocument"));
  const workbook = root?.target ?? "xl/workbook.xml";
  if (!zip.has(workbook) || !/\.xml$/i.test(workbook) || /^(word|ppt)\//.test(workbook)) {
    throw refuseFile(
      "wrong-type",
      "The file is an archive or a document, not a workbook.",
      "Save the table as CSV or as a workbook (.xlsx) and choose that file.",
    );
  }
  const relations = await relationsOf(zip, workbook);
  const { sheets, serialEpoch } = await readSheets(zip, workbook, relations);
  if (sheets.length === 0) throw damaged("it has no worksheet");
  const sharedStrings = await readSharedStrings(zip, ofType(relations, "sharedStrings")?.target);
  const dateStyles = await readDateStyles(zip, ofType(relations, "styles")?.target);
  return { sheets, serialEpoch, sharedStrings, dateStyles };
}
