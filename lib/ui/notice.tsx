import type { ReactNode } from "react";

export interface NoticeProps {
  /** `caution`: the work can hurt someone or spoil something. `info`: good to know. `stop`: this cannot go on. */
  kind?: "info" | "caution" | "stop";
  title?: ReactNode;
  children?: ReactNode;
  actions?: ReactNode;
}

const LOOK = {
  info: { frame: "border-edge", tone: "text-ink", word: null },
  caution: { frame: "border-watch-mark", tone: "text-watch", word: "Caution" },
  stop: { frame: "border-out-mark", tone: "text-out", word: "Stop" },
} as const;

/** A few sentences set apart, with a heavy left edge; a caution always says so in a word. */
export function Notice({ kind = "info", title, children, actions }: NoticeProps) {
  const { frame, tone, word } = LOOK[kind];
  return (
    <div role="note" className={`border-l-4 ${frame} bg-sheet px-4 py-3`}>
      {(word !== null || title !== undefined) && (
        <p className={`font-semibold ${tone}`}>
          {word}
          {word !== null && title !== undefined && ": "}
          {title}
        </p>
      )}
      {children !== undefined && <div className="prose mt-0.5 text-[0.9375rem]">{children}</div>}
      {actions !== undefined && <div className="mt-3 flex flex-wrap gap-2.5">{actions}</div>}
    </div>
  );
}
