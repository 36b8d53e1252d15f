import "server-only";
import { database } from "@/lib/data/database";
import { User } from "@/models";
import { hashPassword, isPassword } from "./password";

let decoy: Promise<string> | undefined;

/** The user with this address and password, or null. Takes as long for an unknown address as for a wrong password. */
export async function verifySignIn(email: string, password: string): Promise<User | null> {
  database();
  const user = await User.findOne({ where: { email } });
  decoy ??= hashPassword("nobody has this password");
  const matches = await isPassword(user?.passwordHash ?? (await decoy), password);
  return user && matches ? user : null;
}
