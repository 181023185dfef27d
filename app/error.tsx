"use client";

import { FailureSheet } from "./_components/layout/FailureSheet";

export default function ErrorPage({ error, retry }: { error: unknown; retry: () => void }) {
  return <FailureSheet error={error} retry={retry} />;
}
