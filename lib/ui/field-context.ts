"use client";
import { createContext, useContext } from "react";

/** What a field tells the control inside it. */
export interface FieldContextValue {
  id: string;
  describedBy: string | undefined;
  invalid: boolean;
  required: boolean;
}

export const FieldContext = createContext<FieldContextValue | null>(null);

/** The attributes that tie a control to its label, hint and error; a control outside a Field keeps its own. */
export function useFieldAttributes(own: {
  id?: string | undefined;
  "aria-describedby"?: string | undefined;
  "aria-invalid"?: boolean | "true" | "false" | "grammar" | "spelling" | undefined;
}): {
  id: string | undefined;
  "aria-describedby": string | undefined;
  "aria-invalid": true | undefined;
  "aria-required": true | undefined;
} {
  const field = useContext(FieldContext);
  const described = [own["aria-describedby"], field?.describedBy].filter(Boolean).join(" ");
  return {
    id: own.id ?? field?.id,
    "aria-describedby": described || undefined,
    "aria-invalid":
      field?.invalid || own["aria-invalid"] === true || own["aria-invalid"] === "true" ? true : undefined,
    "aria-required": field?.required ? true : undefined,
  };
}
