import type { Metadata } from "next";
import { SheetsPage } from "@/components/sheets/SheetsPage";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "Sheets" };

export default async function Page({ params }: { params: Promise<{ jobId: string }> }) {
  const { jobId } = await params;
  await requirePerson(`/jobs/${jobId}/sheets`);
  return <SheetsPage jobId={jobId} />;
}
