"use client";
import { useRouter } from "next/navigation";
import { useEffect } from "react";

const EVERY_MS = 2_500;

/** Asks the page's data anew every few seconds as long as something is under way. */
export function useRefreshWhile(underWay: boolean): void {
  const router = useRouter();
  useEffect(() => {
    if (!underWay) return;
    const timer = setInterval(() => router.refresh(), EVERY_MS);
    return () => clearInterval(timer);
  }, [underWay, router]);
}
