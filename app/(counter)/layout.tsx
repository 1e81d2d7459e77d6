import type { ReactNode } from "react";
import { QueryProvider } from "@/components/ui/QueryProvider";
import { requirePerson } from "@/lib/server/auth/session";

export default async function CounterLayout({ children }: { children: ReactNode }) {
  await requirePerson("/counter");
  return <QueryProvider>{children}</QueryProvider>;
}
