"use client";
import { createContext, type ReactNode, useContext, useState } from "react";

const NonceContext = createContext<string | undefined>(undefined);

/** The nonce that the document was loaded with, for what puts a style sheet into it (the grid's `styleNonce`). */
export function useCspNonce(): string | undefined {
  return useContext(NonceContext);
}

/**
 * Keeps the document's first nonce: a refresh renders a new one, which the loaded document does not know. The meta element
 * is where React Aria looks for it.
 */
export function CspNonceProvider({ nonce, children }: { nonce: string | undefined; children: ReactNode }) {
  const [first] = useState(nonce);
  return (
    <NonceContext value={first}>
      {first !== undefined && <meta property="csp-nonce" content="" nonce={first} suppressHydrationWarning />}
      {children}
    </NonceContext>
  );
}
