import type { Metadata } from "next";
import { ImportPage } from "@/components/library/ImportPage";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "Import library entries" };

export default async function Page() {
  await requirePerson("/library/import");
  return <ImportPage />;
}
