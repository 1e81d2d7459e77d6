import type { Metadata } from "next";
import { CounterJob } from "@/components/counter/CounterJob";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "Permit counter" };

export default async function Page({ params }: { params: Promise<{ jobId: string }> }) {
  const { jobId } = await params;
  await requirePerson(`/counter/${jobId}`);
  return <CounterJob jobId={jobId} />;
}
