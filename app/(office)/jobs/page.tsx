import type { Metadata } from "next";
import { JobsRegister } from "@/components/jobs/JobsRegister";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "Jobs" };

export default async function JobsPage() {
  await requirePerson("/jobs");
  return <JobsRegister />;
}
