import type { Metadata, Viewport } from "next";
import { cookies, headers } from "next/headers";
import type { ReactNode } from "react";
import { CspNonceProvider, LiveMessageProvider, QueryProvider, readTheme, THEME_COOKIE } from "@/lib/ui";
import "./globals.css";

export const metadata: Metadata = {
  title: { default: "Stillwell", template: "%s · Stillwell" },
  description: "Where a facility's water is read truly.",
  robots: { index: false, follow: false },
};

export const viewport: Viewport = { width: "device-width", initialScale: 1 };

export default async function RootLayout({ children }: { children: ReactNode }) {
  const [jar, head] = await Promise.all([cookies(), headers()]);
  const theme = readTheme(jar.get(THEME_COOKIE)?.value);
  return (
    <html lang="en-GB" data-theme={theme}>
      <body>
        <CspNonceProvider nonce={head.get("x-nonce") ?? undefined}>
          <QueryProvider>
            <LiveMessageProvider>{children}</LiveMessageProvider>
          </QueryProvider>
        </CspNonceProvider>
      </body>
    </html>
  );
}
