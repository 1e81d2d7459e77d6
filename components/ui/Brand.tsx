import Link from "next/link";

/** The mark: a ferrule crimped on a conductor. */
export function BrandMark({ className = "h-5 w-[34px]" }: { className?: string }) {
  return (
    <svg viewBox="0 0 34 20" className={className} aria-hidden="true">
      <path d="M1 10H8M8 4.5H22V15.5H8ZM12 4.5V15.5M18 4.5V15.5M22 7.5L33 9V11L22 12.5Z" fill="none" stroke="currentColor" strokeWidth="1.6" strokeLinejoin="round" />
    </svg>
  );
}

/** Mark and name, leading home. */
export function Brand({ href = "/" }: { href?: string }) {
  return (
    <Link href={href} className="flex items-center gap-2 px-3.5 text-[16px] font-heading tracking-[-0.01em] [font-stretch:112%]">
      <BrandMark />
      Ferrule
    </Link>
  );
}
