import type { ReactNode } from "react";
import { LinkButton } from "@/lib/ui";

export interface RefusalProps {
  title: string;
  children: ReactNode;
  actions?: ReactNode;
}

/** A page that says why there is nothing to see here, and where to go instead. */
export function Refusal({ title, children, actions }: RefusalProps) {
  return (
    <div className="grid max-w-2xl gap-4 pt-8">
      <h1>{title}</h1>
      <div className="prose text-ink-2">{children}</div>
      <div className="flex flex-wrap gap-2.5">
        {actions}
        <LinkButton href="/">Go to the start</LinkButton>
      </div>
    </div>
  );
}
