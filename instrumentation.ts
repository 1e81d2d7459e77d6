/** Runs once before the server takes requests. */
export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME !== "nodejs") return;
  const { watchConnections } = await import("./lib/server/http/connection");
  watchConnections();
}
