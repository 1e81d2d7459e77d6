import type { Metadata } from "next";
import { VisitPage } from "@/components/visits/VisitPage";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "Site visit" };

export default async function Page({ params }: { params: Promise<{ jobId: string }> }) {
  const { jobId } = await params;
  await requirePerson(`/jobs/${jobId}/visit`);
  return <VisitPage jobId={jobId} />;
}
