import Link from "next/link";
import { Mark } from "../mark/Mark";

/** The mark and the name, leading home. */
export function Wordmark({ href = "/" }: { href?: string }) {
  return (
    <Link href={href} className="flex items-center gap-2.5 text-lead font-semibold">
      <Mark size={26} className="text-action" />
      Averduct
    </Link>
  );
}
