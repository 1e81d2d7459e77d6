import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { EntrySheet } from "@/components/auth/EntrySheet";
import { SignInForm } from "@/components/auth/SignInForm";
import { pagePerson } from "@/lib/server/auth/session";
import { isEmpty } from "@/lib/server/data/users";

export const metadata: Metadata = { title: "Sign in" };

const NOTICES: Readonly<Record<string, string>> = {
  "signed-out": "You are signed out.",
  "password-changed": "The password is changed. Sign in with the new one.",
};

interface Page { searchParams: Promise<{ next?: string; notice?: string }> }

export default async function SignInPage({ searchParams }: Page) {
  const { next, notice } = await searchParams;
  if (await isEmpty()) redirect("/setup");
  if (await pagePerson()) redirect("/");
  return (
    <EntrySheet title="Sign in" number="E-000">
      <SignInForm next={next} notice={notice === undefined ? undefined : NOTICES[notice]} />
    </EntrySheet>
  );
}
