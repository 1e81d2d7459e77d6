import { redirect } from "next/navigation";
import { requirePerson } from "@/lib/server/auth/session";
import { whoAmI } from "@/lib/server/data/users";

/** Everybody to the page of their work: a clerk to the counter, all others to the jobs. */
export default async function HomePage() {
  const person = await requirePerson("/");
  const { counter, office } = await whoAmI({ ...person, requestId: null, from: null });
  redirect(counter && !office ? "/counter" : "/jobs");
}
