import type { Metadata } from "next";
import { JobPage } from "@/components/jobs/JobPage";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "Issue for review" };

/** The job's page with the issue form open: where the editor's button leads. */
export default async function Page({ params }: { params: Promise<{ jobId: string }> }) {
  const { jobId } = await params;
  await requirePerson(`/jobs/${jobId}/issue`);
  return <JobPage jobId={jobId} issueOpen />;
}
