import type { Metadata } from "next";
import { CounterList } from "@/components/counter/CounterList";
import { requirePerson } from "@/lib/server/auth/session";

export const metadata: Metadata = { title: "Permit counter" };

export default async function Page() {
  await requirePerson("/counter");
  return <CounterList />;
}
