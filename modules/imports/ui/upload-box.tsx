"use client";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { type DragEvent, useRef, useState } from "react";
import { ApiProblem, Button, FormError, NetworkProblem, Progress } from "@/lib/ui";
import { sendFile } from "./send-file";

const KB = 1024;

/** The import that holds the same file already, as the server names it. */
const knownImport = (problem: Error | null): string | null =>
  problem instanceof ApiProblem
    ? (problem.errors.find((error) => error.code === "already-imported")?.detail ?? null)
    : null;

/** A place to drop a file of readings, or to choose one; leads to its import once it has arrived. */
export function UploadBox({ maxMb }: { maxMb: number }) {
  const router = useRouter();
  const input = useRef<HTMLInputElement>(null);
  const [isOver, setIsOver] = useState(false);
  const [sending, setSending] = useState<{ name: string; sent: number; total: number } | null>(null);
  const [problem, setProblem] = useState<ApiProblem | NetworkProblem | null>(null);

  async function send(file: File | undefined): Promise<void> {
    if (!file || sending) return;
    setProblem(null);
    setSending({ name: file.name, sent: 0, total: file.size });
    try {
      const onProgress = (sent: number, total: number) => setSending({ name: file.name, sent, total });
      const { code } = await sendFile(file, crypto.randomUUID(), onProgress);
      router.push(`/imports/${code}`);
    } catch (error) {
      if (!(error instanceof ApiProblem || error instanceof NetworkProblem)) throw error;
      setProblem(error);
      setSending(null);
      if (input.current) input.current.value = "";
    }
  }

  const drop = (event: DragEvent) => {
    event.preventDefault();
    setIsOver(false);
    void send(event.dataTransfer.files[0]);
  };
  const known = knownImport(problem);
  return (
    <div className="grid gap-4">
      <FormError problem={problem && strip(problem)} />
      {known && (
        <p>
          <Link className="link" href={`/imports/${known}`}>
            Open import {known}
          </Link>
        </p>
      )}
      <section
        aria-label="Place for a file"
        className={`flex flex-col items-start gap-3 border-2 border-dashed px-5 py-6 ${isOver ? "border-water bg-wash" : "border-edge"}`}
        onDragOver={(event) => {
          event.preventDefault();
          setIsOver(true);
        }}
        onDragLeave={() => setIsOver(false)}
        onDrop={drop}
      >
        <input
          ref={input}
          id="import-file"
          type="file"
          accept=".csv,.txt,.tsv,.xlsx"
          className="sr-only"
          tabIndex={-1}
          aria-label="File of readings"
          onChange={(event) => void send(event.target.files?.[0])}
        />
        <Button
          variant="next"
          busy={sending !== null}
          busyText="Sending …"
          onClick={() => input.current?.click()}
        >
          Choose a file
        </Button>
        <p className="text-ink-2">
          or drop it here: CSV or an Excel workbook (.xlsx), up to {maxMb} MB. Nothing is stored as a reading
          until you have seen what was understood and committed it.
        </p>
      </section>
      {sending && (
        <Progress
          label={
            sending.sent < sending.total
              ? `Sending ${sending.name}`
              : `${sending.name} has arrived; looking at it`
          }
          done={Math.ceil(sending.sent / KB)}
          total={Math.max(1, Math.ceil(sending.total / KB))}
          noun="KB"
        />
      )}
    </div>
  );
}

/** The sentence alone: the file is no field to which an error could lead. */
function strip(problem: ApiProblem | NetworkProblem): ApiProblem | NetworkProblem {
  if (problem instanceof NetworkProblem) return problem;
  const { title, status, message: detail } = problem;
  return new ApiProblem({ type: "about:blank", title, status, detail });
}
