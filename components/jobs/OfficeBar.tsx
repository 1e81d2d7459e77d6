"use client";

import Link from "next/link";
import { signOut } from "next-auth/react";
import { DropdownMenu } from "radix-ui";
import type { ReactNode } from "react";
import { isNight, setNight } from "@/lib/client/desk";
import { useMe } from "@/lib/client/queries";
import { Bar, BarCell } from "@/components/ui/Bar";
import { LinkButton } from "@/components/ui/Button";

const ITEM = "flex h-bar-control cursor-pointer items-center px-3 text-body outline-none data-[highlighted]:bg-tint";

/** The bar of the office pages: company, then cells of the page, then where else to go. */
export function OfficeBar({ children, primary }: { children?: ReactNode; primary?: ReactNode }) {
  const me = useMe();
  const company = me.data?.companies[0];
  return (
    <Bar
      home="/jobs"
      actions={
        <>
          <LinkButton href="/jobs" size="bar">Jobs</LinkButton>
          {company && <LinkButton href="/library" size="bar">Library</LinkButton>}
          {company && <LinkButton href="/jurisdictions" size="bar">Jurisdictions</LinkButton>}
          {company && <LinkButton href="/people" size="bar">People</LinkButton>}
          {me.data?.companies.some((each) => each.may.records) && <LinkButton href="/records" size="bar">Records</LinkButton>}
          {me.data?.counter && <LinkButton href="/counter" size="bar">Counter</LinkButton>}
          {primary}
          <PersonMenu />
        </>
      }
    >
      {company && <BarCell label="Company">{company.name}</BarCell>}
      {children}
    </Bar>
  );
}

/** Who is signed in, with account and sign-out behind it. */
export function PersonMenu() {
  const { data } = useMe();
  const initials = (data?.name ?? "").split(/\s+/).filter(Boolean).map((word) => word.charAt(0)).slice(0, 2).join("");
  return (
    <DropdownMenu.Root modal={false}>
      <DropdownMenu.Trigger aria-label={data ? `${data.name}: account and sign-out` : "Account"} className="ml-1 grid size-8 place-items-center rounded-full border border-ink bg-paper text-small font-heading stretch-label">
        {initials}
      </DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content align="end" sideOffset={8} className="z-50 min-w-[220px] border border-ink bg-paper shadow-[3px_3px_0_var(--hatch)]">
          <div className="border-b border-g1 px-3 py-2">
            <p className="text-text font-heading">{data?.name}</p>
            <p className="text-label text-ink2">{data?.email}</p>
          </div>
          <DropdownMenu.Item asChild><Link href="/account" className={ITEM}>Account and license</Link></DropdownMenu.Item>
          <DropdownMenu.Item className={ITEM} onSelect={() => setNight(!isNight())}>Dark or light desk</DropdownMenu.Item>
          <DropdownMenu.Item className={ITEM} onSelect={() => void signOut({ callbackUrl: "/sign-in?notice=signed-out" })}>Sign out</DropdownMenu.Item>
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  );
}
