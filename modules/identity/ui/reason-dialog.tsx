"use client";
import { type ReactNode, useState } from "react";
import { Button, Dialog, Field, Textarea } from "@/lib/ui";

export interface ReasonDialogProps {
  open: boolean;
  title: string;
  /** What will happen. */
  children: ReactNode;
  actText: string;
  busy: boolean;
  onAct: (reason: string) => void;
  onClose: () => void;
}

const SHORTEST = 3;

/** Asks why before something is taken from somebody; the reason goes into the history. */
export function ReasonDialog({ open, title, children, actText, busy, onAct, onClose }: ReasonDialogProps) {
  const [reason, setReason] = useState("");
  const [tried, setTried] = useState(false);
  const tooShort = reason.trim().length < SHORTEST;
  return (
    <Dialog
      open={open}
      onClose={onClose}
      title={title}
      actions={
        <>
          <Button
            variant="danger"
            busy={busy}
            busyText="Storing …"
            onClick={() => (tooShort ? setTried(true) : onAct(reason.trim()))}
          >
            {actText}
          </Button>
          <Button onClick={onClose}>Leave it as it is</Button>
        </>
      }
    >
      <div className="grid gap-4">
        <div>{children}</div>
        <Field label="Reason" name="reason" required error={tried && tooShort ? "Say why." : undefined}>
          <Textarea
            rows={3}
            maxLength={300}
            value={reason}
            onChange={(event) => setReason(event.target.value)}
          />
        </Field>
      </div>
    </Dialog>
  );
}
