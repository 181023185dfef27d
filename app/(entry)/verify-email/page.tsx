import type { Metadata } from "next";
import { PlainSheet } from "@/app/_components/layout/PlainSheet";
import { ConfirmEmail } from "./ConfirmEmail";

export const metadata: Metadata = { title: "Confirm your e-mail address" };

export default async function VerifyEmailPage({ searchParams }: { searchParams: Promise<{ token?: string }> }) {
  const { token = "" } = await searchParams;
  return (
    <PlainSheet title="Confirm your e-mail address">
      <ConfirmEmail token={token} />
    </PlainSheet>
  );
}
