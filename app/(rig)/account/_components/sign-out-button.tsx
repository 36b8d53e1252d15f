"use client";
import { signOut } from "next-auth/react";
import { Button } from "@/components/ui/button";
import { paths } from "@/lib/paths";

export function SignOutButton() {
  return <Button onClick={() => void signOut({ redirect: false }).then(() => window.location.assign(paths.home()))}>Sign out</Button>;
}
