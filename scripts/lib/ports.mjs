import net from "node:net";

/**
 * @param {number} port @param {string} [host]
 * @returns {Promise<boolean>} true when nobody listens there
 */
export function isFree(port, host = "127.0.0.1") {
  return new Promise((resolve) => {
    const server = net.createServer();
    server.once("error", () => resolve(false));
    server.listen({ port, host, exclusive: true }, () => server.close(() => resolve(true)));
  });
}

/**
 * A port nobody listens on now.
 * @returns {Promise<number>}
 */
export function freePort() {
  return new Promise((resolve, reject) => {
    const server = net.createServer();
    server.once("error", reject);
    server.listen(0, "127.0.0.1", () => {
      const address = server.address();
      server.close(() => (address && typeof address === "object" ? resolve(address.port) : reject(new Error("no port"))));
    });
  });
}

/**
 * The wanted port, or the next free one after it.
 * @param {number} wanted @param {string} [host] @param {number} [tries]
 * @returns {Promise<number>}
 */
export async function firstFree(wanted, host = "127.0.0.1", tries = 50) {
  for (let port = wanted; port < wanted + tries && port < 65_536; port += 1) {
    if (await isFree(port, host)) return port;
  }
  throw new Error(`No free port from ${wanted} to ${wanted + tries - 1} on ${host}.`);
}
