import type { Metadata } from "next";
import { PlainSheet } from "@/app/_components/layout/PlainSheet";
import { ResetPasswordForm } from "./ResetPasswordForm";

export const metadata: Metadata = { title: "Set a new password" };

export default async function ResetPasswordPage({ searchParams }: { searchParams: Promise<{ token?: string }> }) {
  const { token = "" } = await searchParams;
  return (
    <PlainSheet title="Set a new password">
      <ResetPasswordForm token={token} />
    </PlainSheet>
  );
}
