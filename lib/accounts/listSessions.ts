import { database } from "@/db/connection";
import { aliveSessions, type SignedIn } from "./session";

export interface ListedSession {
  id: string;
  address: string;
  userAgent: string;
  createdAt: Date;
  lastSeenAt: Date;
  /** Whether it is the one that asks. */
  current: boolean;
}

interface SessionRow {
  id: string;
  address: string;
  user_agent: string;
  created_at: Date;
  last_seen_at: Date;
}

/** The sessions somebody has, the latest used first. */
export async function listSessions({ userId, sessionId }: SignedIn): Promise<ListedSession[]> {
  const rows: SessionRow[] = await aliveSessions(database()("sessions as s"), Date.now()).where("s.user_id", userId).orderBy("s.last_seen_at", "desc")
    .select("s.id", "s.address", "s.user_agent", "s.created_at", "s.last_seen_at");
  return rows.map(({ id, address, user_agent, created_at, last_seen_at }) => ({
    id, address, userAgent: user_agent, createdAt: created_at, lastSeenAt: last_seen_at, current: id === sessionId,
  }));
}
