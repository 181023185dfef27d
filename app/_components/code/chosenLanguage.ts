/** The language that the reader last chose to see code in, shared by every block of the page and kept for the next visit. */
const KEY = "averduct-code-language";

const listeners = new Set<() => void>();
let current: string | null | undefined;

/** The choice; null before there is one, or where the browser keeps nothing. */
export function chosenLanguage(): string | null {
  if (current === undefined) {
    try {
      current = localStorage.getItem(KEY);
    } catch {
      current = null;
    }
  }
  return current;
}

export function chooseLanguage(language: string): void {
  current = language;
  try {
    localStorage.setItem(KEY, language);
  } catch {
    // A browser that keeps nothing still holds the choice for this page.
  }
  for (const listener of listeners) listener();
}

export function onLanguageChosen(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}
