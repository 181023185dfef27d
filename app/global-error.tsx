"use client";

import { FailureSheet } from "./_components/layout/FailureSheet";
import "@fontsource-variable/instrument-sans";
import "@fontsource/spline-sans-mono/400.css";
import "./globals.css";

/** In place of the whole document when its layout failed; the reader's own theme is unknown here, so the system's holds. */
export default function GlobalErrorPage({ error, retry }: { error: unknown; retry: () => void }) {
  return (
    <html lang="en">
      <body className="font-sans">
        <title>The page could not be shown · Averduct</title>
        <FailureSheet error={error} retry={retry} />
      </body>
    </html>
  );
}
