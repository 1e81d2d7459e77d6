import type { ReactNode } from "react";
import { QueryProvider } from "@/components/ui/QueryProvider";
import { requirePerson } from "@/lib/server/auth/session";

export default async function OfficeLayout({ children }: { children: ReactNode }) {
  await requirePerson("/jobs");
  return <QueryProvider>{children}</QueryProvider>;
}
