import type { Metadata } from "next";
import { DrawingPage } from "@/components/diagram/drawingPage";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "One-line diagram" };

export default async function Page({ params }: { params: Promise<{ jobId: string }> }) {
  const { jobId } = await params;
  await requirePerson(`/jobs/${jobId}/drawing`);
  return <DrawingPage jobId={jobId} />;
}
