/** A new stable id for an element: never shown, unique across people who draw at the same time. */
export const newId = (prefix: string): string => `${prefix}-${crypto.randomUUID().slice(0, 13)}`;
