import type { Metadata, Viewport } from "next";
import { cookies } from "next/headers";
import { connection } from "next/server";
import type { ReactNode } from "react";
import { fontVariables } from "./fonts";
import "./globals.css";

export const metadata: Metadata = {
  title: { default: "Ferrule", template: "%s · Ferrule" },
  description:
    "One-line drawings for solar and storage installers: drawn on a sheet, checked while drawing, sealed, released and built from.",
};

export const viewport: Viewport = { width: "device-width", initialScale: 1 };

/** Name of the cookie that remembers the desk's look; its value is "day" or "night". */
const deskCookie = "ferrule-desk";

export default async function RootLayout({ children }: { children: ReactNode }) {
  // A page made at build time cannot carry a script nonce: every page is rendered on request.
  await connection();
  const night = (await cookies()).get(deskCookie)?.value === "night";
  return (
    <html lang="en" className={`${fontVariables}${night ? " night" : ""}`}>
      <body>{children}</body>
    </html>
  );
}
