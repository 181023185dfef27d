import { calculateJwkThumbprint, exportJWK, generateKeyPair, type JWK } from "jose";
import type { Knex } from "knex";
import { database } from "@/db/connection";
import { open, seal } from "@/lib/runtime/secretBox";

/** Ed25519 (RFC 8037): short signatures, one way to make them, no randomness that could fail. */
export const ALGORITHM = "EdDSA";

export interface PublicKey {
  id: string;
  publicJwk: JWK;
  createdAt: Date;
  retiredAt: Date | null;
}

interface KeyRow {
  id: string;
  public_jwk: JWK;
  private_encrypted: string;
  created_at: Date;
  retired_at: Date | null;
}

/** The key that signs now, made where there is none yet. */
export async function currentSigningKey(db: Knex = database()): Promise<{ id: string; privateJwk: JWK }> {
  const row = await db<KeyRow>("signing_keys").whereNull("retired_at").orderBy("created_at", "desc").orderBy("id").first();
  if (!row) return makeSigningKey(db);
  return { id: row.id, privateJwk: JSON.parse(open(row.private_encrypted)) as JWK };
}

/** Puts a new key in the place of the one that signs. Old ones stay published, so that what they signed can be checked. */
export async function rotateSigningKey(db: Knex = database()): Promise<{ id: string }> {
  return db.transaction(async (transaction) => {
    await transaction<KeyRow>("signing_keys").whereNull("retired_at").update({ retired_at: new Date() });
    return makeSigningKey(transaction);
  });
}

/** Every public key there ever was, the newest first. */
export async function publicKeys(db: Knex = database()): Promise<PublicKey[]> {
  const rows = await db<KeyRow>("signing_keys").orderBy("created_at", "desc").select("id", "public_jwk", "created_at", "retired_at");
  return rows.map(({ id, public_jwk, created_at, retired_at }) => ({ id, publicJwk: public_jwk, createdAt: created_at, retiredAt: retired_at }));
}

/** The key set as it is published (RFC 7517). */
export async function jwks(): Promise<{ keys: JWK[] }> {
  return { keys: (await publicKeys()).map(({ id, publicJwk }) => ({ ...publicJwk, kid: id, alg: ALGORITHM, use: "sig" })) };
}

async function makeSigningKey(db: Knex): Promise<{ id: string; privateJwk: JWK }> {
  const pair = await generateKeyPair(ALGORITHM, { crv: "Ed25519", extractable: true });
  const [publicJwk, privateJwk] = await Promise.all([exportJWK(pair.publicKey), exportJWK(pair.privateKey)]);
  const id = await calculateJwkThumbprint(publicJwk);
  await db("signing_keys").insert({ id, algorithm: ALGORITHM, public_jwk: JSON.stringify(publicJwk), private_encrypted: seal(JSON.stringify(privateJwk)), created_at: new Date() });
  return { id, privateJwk };
}
