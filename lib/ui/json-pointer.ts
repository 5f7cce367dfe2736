/**
 * Which form field does a JSON pointer name (RFC 6901)? Gives the dotted path of react-hook-form; "" for the whole document.
 * @example pointerToPath("/lines/0/mass~1kg") === "lines.0.mass/kg"
 */
export function pointerToPath(pointer: string): string {
  const plain = pointer.startsWith("#") ? decodeURIComponent(pointer.slice(1)) : pointer;
  if (plain === "" || plain === "/") return "";
  return plain
    .replace(/^\//, "")
    .split("/")
    .map((part) => part.replaceAll("~1", "/").replaceAll("~0", "~"))
    .join(".");
}
