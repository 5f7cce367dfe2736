import type { ReactNode } from "react";

export interface FrameProps {
  /** A StaffNav. */
  nav: ReactNode;
  /** A TopBar. */
  top?: ReactNode;
  children: ReactNode;
}

/** The signed-in page: the staff at the left (a bar below on small screens), the top line, and the page. */
export function Frame({ nav, top, children }: FrameProps) {
  return (
    <div className="frame">
      <a href="#page" className="skip-link">
        Skip to the page
      </a>
      {nav}
      <div className="min-w-0 px-4 pb-10 sm:px-7">
        {top}
        <main id="page" tabIndex={-1} className="outline-none">
          {children}
        </main>
      </div>
    </div>
  );
}
