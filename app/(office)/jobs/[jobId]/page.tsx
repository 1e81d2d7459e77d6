import type { Metadata } from "next";
import { JobPage } from "@/components/jobs/JobPage";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "Job" };

export default async function Page({ params }: { params: Promise<{ jobId: string }> }) {
  const { jobId } = await params;
  await requirePerson(`/jobs/${jobId}`);
  return <JobPage jobId={jobId} />;
}
