import type { Metadata } from "next";
import { JurisdictionPage } from "@/components/jurisdictions/JurisdictionPage";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "Jurisdiction" };

export default async function Page({ params }: { params: Promise<{ jurisdictionId: string }> }) {
  const { jurisdictionId } = await params;
  await requirePerson(`/jurisdictions/${jurisdictionId}`);
  return <JurisdictionPage jurisdictionId={jurisdictionId} />;
}
