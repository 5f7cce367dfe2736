import { fileURLToPath } from "node:url";
import { walkFloors } from "./walk-floors.mjs";

const { files, breaches } = await walkFloors(fileURLToPath(new URL("..", import.meta.url)));
for (const { rule, from, to, via } of breaches) {
  console.log(`${rule}: ${from} → ${to}${via.length > 0 ? `\n    through ${via.join(" → ")}` : ""}`);
}
if (files === 0) console.log("The floors were not walked: no file was found.");
else console.log(`${files} files walked, ${breaches.length} breaches of the floors.`);
process.exitCode = breaches.length > 0 || files === 0 ? 1 : 0;
