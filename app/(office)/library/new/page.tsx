import type { Metadata } from "next";
import { NewEntryPage } from "@/components/library/NewEntryPage";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "New library entry" };

export default async function Page() {
  await requirePerson("/library/new");
  return <NewEntryPage />;
}
