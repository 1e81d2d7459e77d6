import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { EntrySheet } from "@/components/auth/EntrySheet";
import { SetupForm } from "@/components/auth/SetupForm";
import { isEmpty } from "@/lib/server/data/users";

export const metadata: Metadata = { title: "First use" };

export default async function SetupPage() {
  if (!(await isEmpty())) redirect("/sign-in");
  return (
    <EntrySheet title="First use" number="E-000">
      <SetupForm />
    </EntrySheet>
  );
}
