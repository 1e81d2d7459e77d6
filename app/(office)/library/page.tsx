import type { Metadata } from "next";
import { LibraryPage } from "@/components/library/LibraryPage";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "Library" };

export default async function Page() {
  await requirePerson("/library");
  return <LibraryPage />;
}
