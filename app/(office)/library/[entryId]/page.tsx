import type { Metadata } from "next";
import { EntryPage } from "@/components/library/EntryPage";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "Library entry" };

export default async function Page({ params }: { params: Promise<{ entryId: string }> }) {
  const { entryId } = await params;
  await requirePerson(`/library/${entryId}`);
  return <EntryPage entryId={entryId} />;
}
