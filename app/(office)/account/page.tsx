import type { Metadata } from "next";
import { AccountPage } from "@/components/people/AccountPage";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "Account" };

export default async function Page() {
  await requirePerson("/account");
  return <AccountPage />;
}
