"use client";

import { useLeaveGuard } from "@/lib/client/useLeaveGuard";
import { Button } from "./Button";
import { Dialog } from "./Dialog";

/** Asks before a page with unsaved changes is left. */
export function LeaveDialog({ unsaved, what }: { unsaved: boolean; /** What is unsaved, as the beginning of a sentence. */ what: string }) {
  const { held, leave, stay } = useLeaveGuard(unsaved);
  return (
    <Dialog open={held} onOpenChange={(open) => !open && stay()} title="Leave without saving?" description={`${what} not saved and would be lost.`}>
      <div className="flex gap-2">
        <Button look="primary" autoFocus onClick={stay}>Stay here</Button>
        <Button onClick={leave}>Leave without saving</Button>
      </div>
    </Dialog>
  );
}
