import { useRouter } from "next/navigation";
import { useCallback, useEffect, useRef, useState } from "react";

type Way = { to: string } | "back";

/**
 * Holds somebody who would leave a page with things unsaved: by a link, by the browser's Back, by closing it.
 * @returns where they were going, if they were held, with `leave` to go there after all and `stay`
 */
export function useLeaveGuard(unsaved: boolean) {
  const router = useRouter();
  const [held, setHeld] = useState<Way | null>(null);
  const free = useRef(false);

  useEffect(() => {
    if (!unsaved) return;
    free.current = false;
    const closing = (event: BeforeUnloadEvent) => { if (!free.current) event.preventDefault(); };
    const following = (event: MouseEvent) => {
      if (free.current || event.defaultPrevented || event.button !== 0 || event.ctrlKey || event.metaKey || event.shiftKey || event.altKey) return;
      const link = event.target instanceof Element ? event.target.closest("a") : null;
      if (!link || !link.href || link.target === "_blank" || link.hasAttribute("download")) return;
      const to = new URL(link.href);
      if (to.origin !== window.location.origin || (to.pathname === window.location.pathname && to.search === window.location.search)) return;
      // Before the router sees it.
      event.preventDefault();
      event.stopPropagation();
      setHeld({ to: to.pathname + to.search + to.hash });
    };
    // Back lands on a copy of this page's own place first, which leaves the page as it is and gives the time to ask.
    const copied = () => window.history.state !== null && (window.history.state as { guard?: boolean }).guard === true;
    if (!copied()) window.history.pushState({ ...(window.history.state as object | null), guard: true }, "", window.location.href);
    const goingBack = () => { if (!free.current && !copied()) setHeld("back"); };
    window.addEventListener("beforeunload", closing);
    window.addEventListener("popstate", goingBack);
    document.addEventListener("click", following, true);
    return () => {
      window.removeEventListener("beforeunload", closing);
      window.removeEventListener("popstate", goingBack);
      document.removeEventListener("click", following, true);
    };
  }, [unsaved]);

  const stay = useCallback(() => {
    if (held === "back") window.history.forward();
    setHeld(null);
  }, [held]);
  const leave = useCallback(() => {
    free.current = true;
    setHeld(null);
    if (held === "back") window.history.back();
    // In place of the copy, so that Back from there comes to this page once.
    else if (held) router.replace(held.to);
  }, [held, router]);
  return { held: held !== null, leave, stay };
}
