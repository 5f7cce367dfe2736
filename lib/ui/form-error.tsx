"use client";
import { useEffect, useRef } from "react";
import { ApiProblem, type NetworkProblem } from "./api";
import { fieldId } from "./field-id";
import { pointerToPath } from "./json-pointer";

export interface FormErrorProps {
  problem: ApiProblem | NetworkProblem | Error | null | undefined;
  /** Names of fields as on screen, by form path ("taken_at": "Taken at"). */
  labels?: Readonly<Record<string, string>>;
}

/** What the server refused, in sentences, above the form; each points at its field. Takes the focus when it appears. */
export function FormError({ problem, labels = {} }: FormErrorProps) {
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (problem) box.current?.focus({ preventScroll: false });
  }, [problem]);
  if (!problem) return null;
  const errors = problem instanceof ApiProblem ? problem.errors : [];
  const title = problem instanceof ApiProblem ? problem.title : "Not sent";
  return (
    <div ref={box} role="alert" tabIndex={-1} className="border-2 border-out-mark bg-sheet px-4 py-3">
      <p className="font-semibold text-out">{title}</p>
      {problem.message !== title && <p className="mt-1">{problem.message}</p>}
      {errors.length > 0 && (
        <ul className="mt-2 list-disc pl-5">
          {errors.map((error) => {
            const path = pointerToPath(error.pointer);
            const label = labels[path];
            return (
              <li key={`${error.pointer} ${error.code}`}>
                {path === "" ? (
                  error.detail
                ) : (
                  <a
                    href={`#${fieldId(path)}`}
                    className="link inline py-0.5"
                    onClick={(event) => {
                      const field = document.getElementById(fieldId(path));
                      if (field === null) return;
                      event.preventDefault();
                      field.focus();
                    }}
                  >
                    {label ? `${label}: ` : ""}
                    {error.detail}
                  </a>
                )}
              </li>
            );
          })}
        </ul>
      )}
    </div>
  );
}
