import { createHash } from "node:crypto";

/**
 * Passes bytes on and holds the last piece back until all of them have the wanted digest, so that a changed file never
 * arrives whole.
 * @param digest SHA-256, hex
 */
export function checkedStream(digest: string): TransformStream<Uint8Array, Uint8Array> {
  const hash = createHash("sha256");
  let held: Uint8Array | null = null;
  return new TransformStream({
    transform(chunk, controller) {
      hash.update(chunk);
      if (held) controller.enqueue(held);
      held = chunk;
    },
    flush(controller) {
      if (hash.digest("hex") !== digest) {
        console.error(`store: the bytes of ${digest} were changed`);
        controller.error(new Error("a stored file was changed"));
        return;
      }
      if (held) controller.enqueue(held);
    },
  });
}
