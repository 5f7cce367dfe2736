import type { ReactNode } from "react";

export interface EmptyStateProps {
  /** What will stand here ("No rounds yet"). */
  title: ReactNode;
  /** What it is for and how the first one comes about. */
  children: ReactNode;
  actions?: ReactNode;
}

/** An empty place that teaches: what belongs here, who brings it, and the way to begin. */
export function EmptyState({ title, children, actions }: EmptyStateProps) {
  return (
    <div className="flex flex-col items-start gap-3 border border-dashed border-edge px-5 py-7 sm:px-8">
      <svg width="120" height="18" viewBox="0 0 120 18" aria-hidden="true">
        <rect
          x="1"
          y="1"
          width="118"
          height="12"
          rx="6"
          className="fill-none stroke-edge"
          strokeDasharray="3 3"
        />
        <path d="M12 15v2M28 15v2M44 15v2M60 15v3M76 15v2M92 15v2M108 15v2" className="stroke-edge" />
      </svg>
      <p className="font-head text-lg font-semibold">{title}</p>
      <div className="prose text-ink-2">{children}</div>
      {actions !== undefined && <div className="flex flex-wrap gap-2.5">{actions}</div>}
    </div>
  );
}
