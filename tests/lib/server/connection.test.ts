import http from "node:http";
import type { AddressInfo } from "node:net";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { originOf, plainAddress, watchConnections, type Origin } from "@/lib/server/http/connection";

let server: http.Server;
let trust = false;

/** A server that answers with where it thinks a request came from. */
beforeAll(async () => {
  watchConnections();
  watchConnections();
  server = http.createServer((request, response) => {
    const headers = new Headers(Object.entries(request.headers).flatMap(([name, value]) => (typeof value === "string" ? [[name, value] as [string, string]] : [])));
    response.end(JSON.stringify(originOf(headers, trust)));
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
});
afterAll(() => { server.close(); });

async function ask(headers: Record<string, string>): Promise<Origin> {
  const answer = await fetch(`http://127.0.0.1:${(server.address() as AddressInfo).port}`, { headers: { "user-agent": "Test/1", ...headers } });
  return (await answer.json()) as Origin;
}

describe("where a request came from", () => {
  it("is the socket's address, whatever headers claim", async () => {
    trust = false;
    for (const headers of [{}, { "x-forwarded-for": "203.0.113.9" }, { "x-ferrule-peer": "guess 203.0.113.9" }, { "x-ferrule-peer": " 203.0.113.9" }]) {
      expect(await ask(headers as Record<string, string>)).toEqual({ address: "127.0.0.1", userAgent: "Test/1" });
    }
  });

  it("is the last hop behind a trusted proxy, which is the one the proxy wrote", async () => {
    trust = true;
    expect((await ask({ "x-forwarded-for": "10.0.0.1, 203.0.113.9" })).address).toBe("203.0.113.9");
    expect((await ask({ "x-forwarded-for": "nonsense" })).address).toBeNull();
    expect((await ask({})).address).toBeNull();
  });

  it("keeps 200 characters of the program's name", async () => {
    trust = false;
    expect((await ask({ "user-agent": "x".repeat(500) })).userAgent).toHaveLength(200);
    expect(originOf(new Headers(), false)).toEqual({ address: null, userAgent: null });
  });

  // Text forms of addresses: RFC 4291 section 2.2, RFC 5952 section 6 (port), RFC 4007 section 11 (zone).
  it.each([
    ["::ffff:192.0.2.1", "192.0.2.1"], ["192.0.2.1:443", "192.0.2.1"], ["[2001:db8::1]:443", "2001:db8::1"], ["2001:db8::1", "2001:db8::1"], ["fe80::1%eth0", "fe80::1"],
    ["", null], ["unknown", null], ["192.0.2.256", null], ["192.0.2.1; drop", null],
  ])("reads %j as %j", (text, address) => {
    expect(plainAddress(text)).toBe(address);
  });
});
