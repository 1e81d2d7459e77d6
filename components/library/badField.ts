/** First field of a form whose text was not taken; it holds what was typed, which the draft does not. The name says for itself what is wrong. */
export const badField = (form: HTMLElement | null): HTMLElement | null => form?.querySelector<HTMLElement>('[aria-invalid="true"]:not([name="name"])') ?? null;
