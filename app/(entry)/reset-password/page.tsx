import type { Metadata } from "next";
import { PlainSheet } from "@/app/_components/layout/PlainSheet";
import { ResetPasswordForm } from "./ResetPasswordForm";

export const metadata: Metadata = { title: "Set a new password" };

export default async function ResetPasswordPage({ searchParams }: PageProps<"/reset-password">) {
  const { token } = await searchParams;
  return (
    <PlainSheet title="Set a new password">
      <ResetPasswordForm token={typeof token === "string" ? token : ""} />
    </PlainSheet>
  );
}
