import type { Metadata } from "next";
import { RecordsPage } from "@/components/records/RecordsPage";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "Records" };

export default async function Page() {
  await requirePerson("/records");
  return <RecordsPage />;
}
