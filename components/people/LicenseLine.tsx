"use client";

import Link from "next/link";
import { useMe } from "@/lib/client/queries";
import type { LicenseExpiry } from "@/lib/workflow/licenseExpiry";

const INK: Record<LicenseExpiry["nearness"], string> = { expired: "text-red font-strong", "within 30 days": "text-ochre font-strong", "within 90 days": "text-ink2", "in force": "text-ink2" };

/** What has to be said about the end of a license; nothing while it is far. */
export function ExpiryWords({ expiry, className = "" }: { expiry: LicenseExpiry; className?: string }) {
  return expiry.words === null ? null : <span className={`${INK[expiry.nearness]} ${className}`}>{expiry.words}</span>;
}

/** The end of the signed-in person's own license, a quiet line that is there only when it has to be. */
export function LicenseLine({ className = "" }: { className?: string }) {
  const warning = useMe().data?.licenseWarning;
  if (!warning) return null;
  return (
    <p role="status" className={`text-body ${className}`}>
      <span className="text-ink2">Your license: </span><ExpiryWords expiry={warning} />{" "}
      <Link href="/account" className="underline underline-offset-4">{warning.nearness === "expired" ? "Enter the renewed one" : "Account"}</Link>
    </p>
  );
}
