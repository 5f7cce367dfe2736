"use client";
import { type ReactNode, type SyntheticEvent, useId } from "react";
import type { ApiProblem, NetworkProblem } from "./api";
import { Button, type ButtonVariant } from "./button";
import { Dialog } from "./dialog";
import { FormError } from "./form-error";

export interface FormDialogProps {
  title: string;
  onClose: () => void;
  onSubmit: (event: SyntheticEvent) => Promise<void>;
  sending: boolean;
  problem: ApiProblem | NetworkProblem | null;
  /** What the filled button says. */
  act: string;
  /** `danger` for an act that takes something out of use. */
  actVariant?: ButtonVariant;
  wide?: boolean;
  /** Names of fields as on screen, for the list of what was refused. */
  labels?: Readonly<Record<string, string>>;
  children: ReactNode;
}

/** A form in front of the page: its fields, what the server refused, one act and the way back. */
export function FormDialog({
  title,
  onClose,
  onSubmit,
  sending,
  problem,
  act,
  actVariant = "next",
  wide = false,
  labels,
  children,
}: FormDialogProps) {
  const formId = useId();
  return (
    <Dialog
      open
      onClose={onClose}
      title={title}
      dismissable={false}
      width={wide ? "wide" : "narrow"}
      actions={
        <>
          <Button variant={actVariant} type="submit" form={formId} busy={sending} busyText="Sending">
            {act}
          </Button>
          <Button onClick={onClose}>Cancel</Button>
        </>
      }
    >
      <form id={formId} onSubmit={onSubmit} noValidate className="grid gap-4">
        <FormError problem={problem} labels={labels} />
        {children}
      </form>
    </Dialog>
  );
}
