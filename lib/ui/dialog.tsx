"use client";
import type { ReactNode } from "react";
import { Dialog as AriaDialog, Heading, Modal, ModalOverlay } from "react-aria-components";

export interface DialogProps {
  open: boolean;
  onClose: () => void;
  title: ReactNode;
  /** False for an act that must be decided: a click beside it or Escape does not close it. */
  dismissable?: boolean;
  width?: "narrow" | "wide";
  /** The buttons, at the foot; the act first, then the way back. */
  actions?: ReactNode;
  children: ReactNode;
}

/** A question in front of the page: the focus stays in it and returns where it came from. */
export function Dialog({
  open,
  onClose,
  title,
  dismissable = true,
  width = "narrow",
  actions,
  children,
}: DialogProps) {
  return (
    <ModalOverlay
      isOpen={open}
      onOpenChange={(next) => !next && onClose()}
      isDismissable={dismissable}
      isKeyboardDismissDisabled={!dismissable}
      className="dialog-scrim"
    >
      <Modal className={`dialog-box ${width === "wide" ? "max-w-3xl" : "max-w-lg"}`}>
        <AriaDialog className="outline-none" role="dialog">
          <Heading slot="title" level={2} className="border-b border-rule px-5 py-4">
            {title}
          </Heading>
          <div className="px-5 py-4">{children}</div>
          {actions !== undefined && <div className="dialog-actions">{actions}</div>}
        </AriaDialog>
      </Modal>
    </ModalOverlay>
  );
}
