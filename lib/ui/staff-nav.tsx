"use client";
import Link from "next/link";
import { usePathname } from "next/navigation";
import { type CSSProperties, useState } from "react";
import { Button as AriaButton, Dialog, Modal, ModalOverlay } from "react-aria-components";
import { currentHref } from "./current-entry";

export interface StaffItem {
  href: string;
  label: string;
}

export interface StaffNavProps {
  items: readonly StaffItem[];
  /** Entries that are not part of the day's work (Setup, Help). */
  footItems?: readonly StaffItem[];
  /** The path shown; without it, the router's. */
  currentPath?: string;
  /** The product's name, a link to `homeHref`. */
  mark: string;
  homeHref?: string;
}

/** The menu: a graduated staff whose water stands at the current entry; on small screens a bar that opens a sheet. */
export function StaffNav({ items, footItems = [], currentPath, mark, homeHref = "/" }: StaffNavProps) {
  const routerPath = usePathname();
  const here = currentHref([...items, ...footItems], currentPath ?? routerPath ?? "");
  const wetFrom = items.findIndex((item) => item.href === here);
  const wetFoot = footItems.findIndex((item) => item.href === here);
  return (
    <>
      <nav className="staff" aria-label="Main">
        <div className="staff-head">
          <Link href={homeHref} className="staff-mark">
            {mark}
          </Link>
        </div>
        <StaffList items={items} here={here} wetFrom={wetFrom} />
        <div className="staff-fill" data-wet={wetFrom >= 0} />
        {footItems.length > 0 && (
          <StaffList items={footItems} here={here} wetFrom={wetFrom >= 0 ? -2 : wetFoot} foot />
        )}
      </nav>
      <StaffBar items={items} footItems={footItems} here={here} mark={mark} />
    </>
  );
}

interface StaffListProps {
  items: readonly StaffItem[];
  here: string | undefined;
  /** Index of the entry at which the water stands; -1 all dry, -2 all wet. */
  wetFrom: number;
  foot?: boolean;
  rows?: number;
  onFollow?: () => void;
}

function StaffList({ items, here, wetFrom, foot = false, rows, onFollow }: StaffListProps) {
  return (
    <ul
      className={`staff-list ${foot ? "staff-foot" : ""}`}
      style={rows ? ({ "--rows": rows } as CSSProperties) : undefined}
    >
      {items.map((item, index) => {
        const isHere = item.href === here;
        const wet = wetFrom === -2 || (wetFrom >= 0 && index > wetFrom);
        return (
          <li key={item.href} data-wet={wet} data-here={isHere}>
            <Link
              href={item.href}
              // A page is asked for when somebody goes there: a menu that fetches all of them loads the server for nothing.
              prefetch={false}
              className="staff-link"
              aria-current={isHere ? "page" : undefined}
              onClick={onFollow}
            >
              {item.label}
            </Link>
            {isHere && <Meniscus />}
          </li>
        );
      })}
    </ul>
  );
}

/** The level: flat in the middle, climbing at both walls. */
function Meniscus() {
  return (
    <svg className="staff-meniscus" viewBox="0 0 200 13" preserveAspectRatio="none" aria-hidden="true">
      <path d="M0 1C5 9 14 12 34 12H166C186 12 195 9 200 1" />
    </svg>
  );
}

interface StaffBarProps {
  items: readonly StaffItem[];
  footItems: readonly StaffItem[];
  here: string | undefined;
  mark: string;
}

function StaffBar({ items, footItems, here, mark }: StaffBarProps) {
  const [open, setOpen] = useState(false);
  const label = [...items, ...footItems].find((item) => item.href === here)?.label;
  const close = () => setOpen(false);
  return (
    <div className="staff-bar">
      <AriaButton className="staff-bar-button" onPress={() => setOpen(true)} aria-haspopup="dialog">
        <StaffSign />
        <span>
          Menu
          {label !== undefined && <span className="font-normal text-ink-2"> · {label}</span>}
        </span>
      </AriaButton>
      <ModalOverlay className="staff-scrim" isOpen={open} onOpenChange={setOpen} isDismissable>
        <Modal className="staff-sheet">
          <Dialog aria-label="Main menu" className="outline-none">
            <div className="flex items-center justify-between py-1 pr-3 pl-5">
              <span className="font-head text-xl font-extrabold tracking-tight">{mark}</span>
              <AriaButton slot="close" className="btn" data-variant="quiet">
                Close
              </AriaButton>
            </div>
            <nav aria-label="Main">
              <StaffList
                items={items}
                here={here}
                wetFrom={-1}
                rows={Math.ceil(items.length / 2)}
                onFollow={close}
              />
              {footItems.length > 0 && (
                <StaffList items={footItems} here={here} wetFrom={-1} foot rows={1} onFollow={close} />
              )}
            </nav>
          </Dialog>
        </Modal>
      </ModalOverlay>
    </div>
  );
}

/** The small sign of the bar: a piece of staff with its water. */
function StaffSign() {
  return (
    <svg width="26" height="26" viewBox="0 0 26 26" aria-hidden="true" className="flex-none">
      <path d="M17.5 2v22M24.5 2v22" className="stroke-edge" fill="none" />
      <rect x="18" y="15" width="6" height="9" className="fill-wash" />
      <path d="M6 5h11.5M11 10h6.5M6 20h11.5" className="stroke-ink-2" strokeWidth="1.5" fill="none" />
      <path d="M2 15h22.5" className="stroke-water" strokeWidth="2.5" fill="none" />
    </svg>
  );
}
