import { randomBytes } from "node:crypto";
import { subscribe } from "node:diagnostics_channel";
import type { IncomingMessage } from "node:http";
import { isIP } from "node:net";

/** Where a request came from, as far as it is known. */
export interface Origin { address: string | null; userAgent: string | null }

/** Longest program name that is kept. */
const USER_AGENT_LENGTH = 200;
const PEER = "x-ferrule-peer";
const holder = globalThis as typeof globalThis & { ferrulePeerToken?: string };

/**
 * Notes the address of the socket with each request of this process, in a header that cannot be sent from outside: the framework hands
 * handlers no socket, and what it writes into x-forwarded-for it takes from whoever sent that header.
 */
export function watchConnections(): void {
  if (holder.ferrulePeerToken) return;
  const token = (holder.ferrulePeerToken = randomBytes(16).toString("hex"));
  subscribe("http.server.request.start", (message) => {
    const { request } = message as { request: IncomingMessage };
    request.headers[PEER] = `${token} ${request.socket.remoteAddress ?? ""}`;
  });
}

/**
 * Address and program of who asks. Without `trustProxy` the address is that of the socket, whatever headers say; with it, it is the last
 * one in x-forwarded-for, which the proxy itself wrote.
 */
export function originOf(headers: Headers, trustProxy: boolean): Origin {
  const [token, peer] = (headers.get(PEER) ?? "").split(" ");
  const socket = token !== "" && token === holder.ferrulePeerToken ? peer : undefined;
  const hop = trustProxy ? headers.get("x-forwarded-for")?.split(",").at(-1) : socket;
  return { address: plainAddress(hop ?? ""), userAgent: headers.get("user-agent")?.slice(0, USER_AGENT_LENGTH) || null };
}

/** An address without port, brackets, zone and the prefix of IPv4 within IPv6; null when it is none. */
export function plainAddress(text: string): string | null {
  const given = text.trim();
  const bare = /^\[(.+)\](?::\d+)?$/.exec(given)?.[1] ?? /^([\d.]+):\d+$/.exec(given)?.[1] ?? given;
  const address = bare.replace(/%.*$/, "").replace(/^::ffff:(?=\d+\.)/i, "");
  return isIP(address) === 0 ? null : address;
}
