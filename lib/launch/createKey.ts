import { parseArgs } from "node:util";
import { SCOPES, type Scope } from "@/api-spec/define";
import { database } from "@/db/connection";
import { prepareDatabase } from "@/db/prepare";
import { newId } from "@/lib/ids/newId";
import { createKey } from "@/lib/keys/createKey";
import { Problem } from "@/lib/problems/problem";
import { withDatabase } from "./withDatabase";
import { CannotStart } from "./say.mjs";

const HELP = `Makes an API key from the command line, for a fresh installation.

  npm run key -- --organisation "Slateboard Software" [options]

  --organisation NAME   organisation the key belongs to; made (on the plan "trial") if there is none of this name
  --name TEXT           what the key is for                       (default: Command line)
  --environment ENV     sandbox or production                     (default: sandbox)
  --scopes LIST         separated by commas                       (default: calculations)
                        ${Object.keys(SCOPES).join(", ")}
  --days N              days until the key expires                (default: never)
  --networks LIST       networks it may be used from, as CIDR, separated by commas (default: everywhere)
  --help                this text

The key is printed once and cannot be shown again. Uses DATABASE_URL, or the installation's own database.`;

export async function main(commandArguments: string[]): Promise<void> {
  const options = readOptions(commandArguments);
  if (options.help || !options.organisation) {
    console.log(HELP);
    return;
  }
  const scopes = options.scopes.split(",").map((scope) => scope.trim());
  const unknown = scopes.filter((scope) => !(scope in SCOPES));
  if (unknown.length > 0) throw new CannotStart(`No such scope: ${unknown.join(", ")}. Scopes are: ${Object.keys(SCOPES).join(", ")}.`);
  if (options.environment !== "sandbox" && options.environment !== "production") throw new CannotStart("--environment is sandbox or production.");
  const days = options.days === undefined ? null : Number(options.days);
  if (days !== null && !(days > 0)) throw new CannotStart("--days is a number above 0.");

  const { environment, organisation, name, networks } = options;
  await withDatabase(async (databaseUrl) => {
    await prepareDatabase(databaseUrl);
    const { text } = await createKey({
      organisationId: await organisationNamed(organisation),
      environment,
      name,
      scopes: scopes as Scope[],
      expiresAt: days === null ? null : new Date(Date.now() + days * 86_400_000),
      allowedNetworks: networks ? networks.split(",").map((network) => network.trim()) : null,
      createdBy: null,
    }).catch((error: unknown) => {
      throw error instanceof Problem ? new CannotStart(error.message) : error;
    });
    console.log(text);
  });
}

function readOptions(commandArguments: string[]) {
  try {
    return parseArgs({
      args: commandArguments,
      options: {
        organisation: { type: "string" },
        name: { type: "string", default: "Command line" },
        environment: { type: "string", default: "sandbox" },
        scopes: { type: "string", default: "calculations" },
        days: { type: "string" },
        networks: { type: "string" },
        help: { type: "boolean", default: false },
      },
    }).values;
  } catch (error) {
    throw new CannotStart(`${error instanceof Error ? error.message : String(error)}\n\n${HELP}`);
  }
}

async function organisationNamed(name: string): Promise<string> {
  const found = await database()("organisations").where({ name }).orderBy("id").first("id");
  if (found) return found.id as string;
  const id = newId("org");
  await database()("organisations").insert({ id, name, plan_id: "trial" });
  return id;
}
