"use client";
import { useState } from "react";
import { Button, Dialog, Field, FormError, Textarea, useAct } from "@/lib/ui";
import type { ImportDetail } from "../model";

export type MayDo = { upload: boolean; withdraw: boolean };

const SHORTEST = 3;
const number = (value: number) => value.toLocaleString("en-GB");

/** What can be done with an import now: commit it, check it anew, lay it aside, withdraw it. */
export function ImportActs({ detail, mayDo }: { detail: ImportDetail; mayDo: MayDo }) {
  const { act, busy, problem } = useAct();
  const [asks, setAsks] = useState<"discard" | "withdraw" | null>(null);
  const path = `/api/v1/imports/${detail.id}`;
  const { state } = detail;
  const accepted = detail.acceptedCount ?? 0;
  const canDiscard =
    mayDo.upload && ["uploaded", "questions", "checking", "checked", "failed"].includes(state);
  const canCheck = mayDo.upload && (state === "checked" || state === "failed");
  const canWithdraw = mayDo.withdraw && state === "committed";
  if (!canDiscard && !canCheck && !canWithdraw) return null;
  return (
    <div className="grid gap-3">
      <FormError problem={asks === null ? problem : null} />
      <div className="flex flex-wrap gap-2.5">
        {mayDo.upload && state === "checked" && accepted > 0 && (
          <Button
            variant="next"
            busy={busy}
            busyText="Sending …"
            onClick={() => void act(`${path}/commit`, {}, { done: "The readings are being brought in." })}
          >
            {accepted === 1 ? "Commit 1 reading" : `Commit ${number(accepted)} readings`}
          </Button>
        )}
        {canCheck && (
          <Button
            busy={busy}
            busyText="Sending …"
            onClick={() => void act(`${path}/check`, {}, { done: "The rows are being checked anew." })}
          >
            Check again
          </Button>
        )}
        {canDiscard && <Button onClick={() => setAsks("discard")}>Lay aside</Button>}
        {canWithdraw && (
          <Button variant="danger" onClick={() => setAsks("withdraw")}>
            Withdraw this import
          </Button>
        )}
      </div>
      {asks === "discard" && (
        <Dialog
          open
          onClose={() => setAsks(null)}
          title={`Lay ${detail.code} aside?`}
          actions={
            <>
              <Button
                variant="next"
                busy={busy}
                onClick={() =>
                  void act(`${path}/discard`, {}, { done: "Laid aside.", then: () => setAsks(null) })
                }
              >
                Lay aside
              </Button>
              <Button onClick={() => setAsks(null)}>Leave it as it is</Button>
            </>
          }
        >
          <FormError problem={problem} />
          <p>None of it becomes a reading. The file is kept and can be uploaded again.</p>
        </Dialog>
      )}
      {asks === "withdraw" && <WithdrawDialog detail={detail} onClose={() => setAsks(null)} />}
    </div>
  );
}

function WithdrawDialog({ detail, onClose }: { detail: ImportDetail; onClose: () => void }) {
  const { act, busy, problem } = useAct();
  const [reason, setReason] = useState("");
  const [tried, setTried] = useState(false);
  const isShort = reason.trim().length < SHORTEST;
  const send = () => {
    setTried(true);
    if (isShort) return;
    const done = `${detail.code} is withdrawn.`;
    void act(`/api/v1/imports/${detail.id}/withdrawal`, { reason: reason.trim() }, { done, then: onClose });
  };
  return (
    <Dialog
      open
      onClose={onClose}
      title={`Withdraw ${detail.code}?`}
      actions={
        <>
          <Button variant="danger" busy={busy} busyText="Sending …" onClick={send}>
            Withdraw
          </Button>
          <Button onClick={onClose}>Leave it as it is</Button>
        </>
      }
    >
      <div className="grid gap-4">
        <FormError problem={problem} />
        <p>
          All {number(detail.acceptedCount ?? 0)} readings of this import stop counting at once; what was
          judged by them is judged again. They stay readable, with your name and reason. The file can then be
          imported anew.
        </p>
        <Field
          label="Reason"
          name="reason"
          required
          error={tried && isShort ? "Say why in a few words." : undefined}
        >
          <Textarea
            rows={3}
            maxLength={500}
            value={reason}
            onChange={(event) => setReason(event.target.value)}
          />
        </Field>
      </div>
    </Dialog>
  );
}
