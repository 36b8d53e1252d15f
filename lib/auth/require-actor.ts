import "server-only";
import { redirect } from "next/navigation";
import { AppError } from "@/lib/errors";
import { paths } from "@/lib/paths";
import { currentUser, type CurrentUser } from "./current-user";

/** For pages: the signed-in person, or off to the sign-in page and back. */
export async function requireActor(returnTo?: string): Promise<CurrentUser> {
  const user = await currentUser();
  if (!user) redirect(paths.signIn(returnTo));
  return user;
}

/** For route handlers: the signed-in person. @throws AppError not-signed-in */
export async function requireApiActor(): Promise<CurrentUser> {
  const user = await currentUser();
  if (!user) throw new AppError("not-signed-in");
  return user;
}
