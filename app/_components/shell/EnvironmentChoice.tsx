"use client";

import { useRouter } from "next/navigation";
import { useId } from "react";
import type { Environment } from "@/lib/keys/keyText";
import { ENVIRONMENT_COOKIE } from "@/lib/records/environments";

const ONE_YEAR_S = 31_536_000;

/** Which environment's records the portal shows. They never mix. */
export function EnvironmentChoice({ chosen }: { chosen: Environment }) {
  const router = useRouter();
  const id = useId();
  return (
    <div className="flex items-center gap-2 text-small">
      <label htmlFor={id} className="text-muted">
        Records of
      </label>
      <select
        id={id}
        value={chosen}
        onChange={(event) => {
          document.cookie = `${ENVIRONMENT_COOKIE}=${event.target.value}; path=/; max-age=${ONE_YEAR_S}; samesite=lax`;
          router.refresh();
        }}
        className="min-h-7 border border-edge rounded-control bg-card px-1.5 text-ink"
      >
        <option value="sandbox">Sandbox</option>
        <option value="production">Production</option>
      </select>
    </div>
  );
}
