import type { Metadata } from "next";
import { PeoplePage } from "@/components/people/PeoplePage";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "People" };

export default async function Page() {
  await requirePerson("/people");
  return <PeoplePage />;
}
