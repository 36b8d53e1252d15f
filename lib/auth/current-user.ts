import "server-only";
import { getServerSession } from "next-auth";
import { database } from "@/lib/data/database";
import { User } from "@/models";
import { authOptions } from "./auth-options";

export interface CurrentUser {
  userId: string;
  name: string;
  email: string;
}

/** Who is signed in, read afresh from the database on each request; null for a visitor or an ended session. */
export async function currentUser(): Promise<CurrentUser | null> {
  const session = await getServerSession(authOptions);
  if (!session?.userId) return null;
  database();
  const user = await User.findByPk(session.userId);
  if (!user || user.sessionEpoch !== session.sessionEpoch) return null;
  return { userId: user.id, name: user.name, email: user.email };
}
