const PATHS = {
  undo: "M3 6.5H11A4 4 0 0 1 11 14.5H7M6 3L2.5 6.5L6 10",
  redo: "M15 6.5H7A4 4 0 0 0 7 14.5H11M12 3L15.5 6.5L12 10",
  find: "M12.3 7.5a4.8 4.8 0 1 1-9.6 0a4.8 4.8 0 1 1 9.6 0M11 11L15.5 15.5",
  minus: "M3.5 9H14.5",
  plus: "M3.5 9H14.5M9 3.5V14.5",
  close: "M4 4L14 14M14 4L4 14",
  warn: "M9 2.5L16.5 15.5H1.5ZM9 7V11M9 12.6V13.6",
  offline: "M2 7A10 10 0 0 1 16 7M5 10.2A6 6 0 0 1 13 10.2M2 2L16 16M9 13.4V14.2",
  lock: "M5.5 8V5.5A3.5 3.5 0 0 1 12.5 5.5V8M3.5 8H14.5V16H3.5Z",
  fit: "M3 6.5V3H6.5M11.5 3H15V6.5M15 11.5V15H11.5M6.5 15H3V11.5",
  down: "M4 7L9 12L14 7",
  up: "M4 11L9 6L14 11",
} as const;
export type IconName = keyof typeof PATHS;

export function Icon({ name, size = 18 }: { name: IconName; size?: number }) {
  return (
    <svg viewBox="0 0 18 18" width={size} height={size} className="flex-none fill-none stroke-current" strokeWidth={1.7} aria-hidden="true">
      <path d={PATHS[name]} />
    </svg>
  );
}

/** The product's mark: a ferrule on its wire. */
export function FerruleMark() {
  return (
    <svg viewBox="0 0 34 20" width={34} height={20} className="fill-none stroke-current" strokeWidth={1.6} strokeLinejoin="round" aria-hidden="true">
      <path d="M1 10H8M8 4.5H22V15.5H8ZM12 4.5V15.5M18 4.5V15.5M22 7.5L33 9V11L22 12.5Z" />
    </svg>
  );
}
