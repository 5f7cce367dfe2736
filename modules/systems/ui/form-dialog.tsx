"use client";
import { type ReactNode, type SyntheticEvent, useId } from "react";
import { type ApiProblem, Button, Dialog, FormError, type NetworkProblem } from "@/lib/ui";

export type FormDialogProps = {
  title: string;
  onClose: () => void;
  onSubmit: (event: SyntheticEvent) => Promise<void>;
  sending: boolean;
  problem: ApiProblem | NetworkProblem | null;
  /** What the filled button says. */
  act: string;
  wide?: boolean;
  children: ReactNode;
};

/** A form in front of the page: its fields, what the server refused, one act and the way back. */
export function FormDialog({
  title,
  onClose,
  onSubmit,
  sending,
  problem,
  act,
  wide,
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
          <Button variant="next" type="submit" form={formId} busy={sending} busyText="Sending">
            {act}
          </Button>
          <Button onClick={onClose}>Cancel</Button>
        </>
      }
    >
      <form id={formId} onSubmit={onSubmit} noValidate className="grid gap-4">
        <FormError problem={problem} />
        {children}
      </form>
    </Dialog>
  );
}
