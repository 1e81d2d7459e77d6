import type { Metadata } from "next";
import { JurisdictionsPage } from "@/components/jurisdictions/JurisdictionsPage";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "Jurisdictions" };

export default async function Page() {
  await requirePerson("/jurisdictions");
  return <JurisdictionsPage />;
}
