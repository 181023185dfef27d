import type { Metadata } from "next";
import { PlainSheet } from "@/app/_components/layout/PlainSheet";
import { ConfirmEmail } from "./ConfirmEmail";

export const metadata: Metadata = { title: "Confirm your e-mail address" };

export default async function VerifyEmailPage({ searchParams }: PageProps<"/verify-email">) {
  const { token } = await searchParams;
  return (
    <PlainSheet title="Confirm your e-mail address">
      <ConfirmEmail token={typeof token === "string" ? token : ""} />
    </PlainSheet>
  );
}
