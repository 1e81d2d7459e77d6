import type { Metadata } from "next";
import { NewJobForm } from "@/components/jobs/NewJobForm";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "New job" };

export default async function NewJobPage() {
  await requirePerson("/jobs/new");
  return <NewJobForm />;
}
