/** Cookie that remembers the desk's look, so that the first picture of a page is right already. */
const COOKIE = "ferrule-desk";
const YEAR_S = 365 * 24 * 3600;

export const isNight = (): boolean => document.documentElement.classList.contains("night");

/** Makes the desk dark or light, here and on the pages to come. */
export function setNight(night: boolean): void {
  document.documentElement.classList.toggle("night", night);
  document.cookie = `${COOKIE}=${night ? "night" : "day"}; path=/; max-age=${YEAR_S}; samesite=lax`;
}
