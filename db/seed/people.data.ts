import type { Role } from "@/modules/access";

/** The invented people of Corran Sound Marine Station. All of them sign in with the same password in the demonstration. */
export const PEOPLE: readonly {
  key: string;
  name: string;
  roles: readonly Role[];
  areas?: readonly string[];
}[] = [
  { key: "marek", name: "Marek Dvorsky", roles: ["admin"] },
  { key: "ines", name: "Ines Marlow", roles: ["lead"] },
  { key: "noor", name: "Noor Haddaway", roles: ["lead", "aquarist"] },
  { key: "joy", name: "Joy Okafor", roles: ["aquarist"], areas: ["SHORE", "REEF"] },
  { key: "tomas", name: "Tomas Brandt", roles: ["operator"] },
  { key: "priya", name: "Priya Nairn", roles: ["analyst"] },
  { key: "samuel", name: "Samuel Achter", roles: ["veterinarian"] },
  { key: "ruth", name: "Ruth Calder", roles: ["auditor"] },
  { key: "elin", name: "Elin Voss", roles: ["reader"] },
];

export const DEMO_PASSWORD = "quiet pipe true level";

export const emailOf = (key: string): string => `${key}@corran-sound.example`;
