"use client";
import { signOut } from "next-auth/react";

/** Ends this sign-in on the server and goes to the sign-in page. */
export function leave(): void {
  void signOut({ callbackUrl: "/sign-in" });
}
