"use client";
import { useState } from "react";
import { Button, Field, FormError, RadioButtons, Select, useAct } from "@/lib/ui";
import type { FileQuestion, ImportDetail } from "../model";

const NAMES: Record<FileQuestion["kind"], "dateOrder" | "decimalSign" | "doubledHour"> = {
  "date-order": "dateOrder",
  "decimal-sign": "decimalSign",
  "doubled-hour": "doubledHour",
};

/** What the file does not say itself, each with what either answer makes of an example. */
export function QuestionsForm({ detail }: { detail: ImportDetail }) {
  const { act, busy, problem } = useAct();
  const [said, setSaid] = useState<Record<string, string>>({});
  const [tried, setTried] = useState(false);
  const wanted = [
    ...detail.questions.map((each) => NAMES[each.kind]),
    ...(detail.systemQuestion ? ["system"] : []),
  ];
  const isMissing = (name: string) => tried && !said[name];
  const say = (name: string, value: string) => setSaid((before) => ({ ...before, [name]: value }));
  const send = async () => {
    setTried(true);
    if (wanted.some((name) => !said[name])) return;
    await act(`/api/v1/imports/${detail.id}/answers`, said, {
      done: "Thank you; the rows are being checked.",
    });
  };
  return (
    <div className="grid gap-6">
      <FormError problem={problem} />
      {detail.questions.map((each) => (
        <Question
          key={each.kind}
          question={each}
          value={said[NAMES[each.kind]] ?? ""}
          error={isMissing(NAMES[each.kind]) ? "Choose one of the readings." : undefined}
          onSay={(value) => say(NAMES[each.kind], value)}
        />
      ))}
      {detail.systemQuestion && (
        <Field
          label={detail.systemQuestion.question}
          name="system"
          required
          error={isMissing("system") ? "Choose the system." : undefined}
        >
          <Select
            value={said.system ?? ""}
            onChange={(event) => say("system", event.target.value)}
            options={[
              { value: "", label: "Choose a system" },
              ...detail.systemQuestion.systems.map(({ code, name }) => ({
                value: code,
                label: `${code} · ${name}`,
              })),
            ]}
          />
        </Field>
      )}
      <div>
        <Button variant="next" busy={busy} busyText="Sending …" onClick={() => void send()}>
          Check the rows
        </Button>
      </div>
    </div>
  );
}

type QuestionProps = {
  question: FileQuestion;
  value: string;
  error: string | undefined;
  onSay: (value: string) => void;
};

function Question({ question, value, error, onSay }: QuestionProps) {
  const { question: sentence, rows, kind, choices } = question;
  const hint = rows > 1 ? `${rows.toLocaleString("en-GB")} rows depend on it.` : "One row depends on it.";
  return (
    <Field label={sentence} name={NAMES[kind]} group required hint={hint} error={error}>
      <RadioButtons
        name={NAMES[kind]}
        value={value}
        onChange={(event) => onSay(event.target.value)}
        options={choices.map((choice) => ({
          value: choice.answer,
          label: (
            <>
              {choice.label}: <b className="font-semibold tabular-nums">{choice.reading}</b>
            </>
          ),
        }))}
      />
    </Field>
  );
}
