import type { Demo } from "@/db/seeds/demo";

/** All that a newcomer needs for the first call. */
export function printWelcome(url: string, demo: Demo | null): void {
  const lines = ["", `Averduct is ready at ${url}`, ""];
  if (demo) {
    lines.push("Demo sign-ins (local data only):");
    for (const { role, email, password } of demo.signIns) lines.push(`  ${role.padEnd(14)} ${email.padEnd(36)} ${password}`);
    lines.push("", "Sandbox key:", `  ${demo.sandboxKey}`, "", "A first call:", firstCall(url, demo.sandboxKey), "");
  }
  lines.push(`Sign in at ${url}/sign-in, reference at ${url}/docs/reference`, "Stop with Ctrl-C.", "");
  console.log(lines.join("\n"));
}

const firstCall = (url: string, key: string): string =>
  [
    `  curl -s ${url}/api/v1/calculations/airflow \\`,
    `    -H "Authorization: Bearer ${key}" -H "Content-Type: application/json" \\`,
    `    -d '{"duct":{"shape":"round","measured":"inside","diameter":{"value":14,"unit":"in"}},"readings":{"kind":"velocity","unit":"ft/min","lines":[[812,934,1010,1004,921,806],[798,926,1013,1009,930,811]]}}'`,
  ].join("\n");
