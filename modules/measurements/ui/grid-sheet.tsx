"use client";
import { useEffect, useRef } from "react";
import { useCspNonce } from "@/lib/ui";
import type { GridDesk } from "./grid-desk";
import { type GridTable, showGrid } from "./grid-table";

export interface GridSheetProps {
  desk: GridDesk;
  onCell: (key: string | null) => void;
  say: (text: string) => void;
  onLeave: () => void;
  /** The grid once it stands; null when it is gone. */
  onTable: (table: GridTable | null) => void;
}

/** The place of the grid on the page. Heavy: load it by next/dynamic. */
export function GridSheet({ desk, onCell, say, onLeave, onTable }: GridSheetProps) {
  const place = useRef<HTMLDivElement>(null);
  const nonce = useCspNonce();
  useEffect(() => {
    if (!place.current) return;
    const table = showGrid(place.current, {
      desk,
      nonce,
      say,
      onLeave,
      onFocus: (at) => onCell(at && desk.keyAt(at.row, at.column)),
    });
    onTable(table);
    return () => {
      onTable(null);
      table.destroy();
    };
  }, [desk, nonce, say, onLeave, onCell, onTable]);
  return <div ref={place} className="desk-grid" />;
}
