import type { Metadata, Viewport } from "next";
import { cookies } from "next/headers";
import type { ReactNode } from "react";
import "@fontsource-variable/instrument-sans";
import "@fontsource/spline-sans-mono/400.css";
import "@fontsource/spline-sans-mono/600.css";
import "./globals.css";
import { THEME_COOKIE, themeFrom } from "./_components/shell/themes";

export const metadata: Metadata = {
  title: { default: "Averduct: duct traverse readings into airflow", template: "%s · Averduct" },
  description: "A public HTTP API that turns duct traverse readings into airflow, with the working, the uncertainty and the suspected slips.",
};

export const viewport: Viewport = {
  themeColor: [
    { media: "(prefers-color-scheme: light)", color: "#ffffff" },
    { media: "(prefers-color-scheme: dark)", color: "#1a211f" },
  ],
};

/** The document. The reader's theme comes with the request, so that no page flashes in the other one. */
export default async function RootLayout({ children }: { children: ReactNode }) {
  const theme = themeFrom((await cookies()).get(THEME_COOKIE)?.value);
  return (
    <html lang="en" data-theme={theme}>
      <body className="font-sans">{children}</body>
    </html>
  );
}
