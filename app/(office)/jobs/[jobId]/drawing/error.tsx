"use client";
import { DrawingTrouble } from "@/components/diagram/chrome/drawingTrouble";

export default function Trouble({ error, reset }: { error: Error & { digest?: string }; reset: () => void }) {
  return <DrawingTrouble title="The drawing stopped working" detail="What was not saved yet is kept on this device and is put back when the drawing opens again." requestId={error.digest ?? null} onRetry={reset} />;
}
