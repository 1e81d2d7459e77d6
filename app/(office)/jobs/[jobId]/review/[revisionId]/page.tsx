import type { Metadata } from "next";
import { ReviewPage } from "@/components/review/ReviewPage";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "Review" };

export default async function Page({ params }: { params: Promise<{ jobId: string; revisionId: string }> }) {
  const { jobId, revisionId } = await params;
  await requirePerson(`/jobs/${jobId}/review/${revisionId}`);
  return <ReviewPage revisionId={revisionId} />;
}
