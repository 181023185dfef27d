import { Button } from "../actions/Button";
import { LinkButton } from "../actions/LinkButton";
import { PlainSheet } from "./PlainSheet";

/** What both error pages show: the page broke, nothing was sent twice, here is what to do. */
export function FailureSheet({ error, retry }: { error: unknown; retry: () => void }) {
  return (
    <PlainSheet title="The page could not be shown" code="500">
      <p>Something failed on our side. Nothing that you had saved is lost. Try again; if it fails once more, report the reference below.</p>
      <p className="mt-3 font-mono text-small text-muted">Reference {digestOf(error) ?? "none"}</p>
      <div className="mt-4 flex flex-wrap gap-2">
        <Button variant="primary" onClick={retry}>
          Try again
        </Button>
        <LinkButton href="/">Home</LinkButton>
      </div>
    </PlainSheet>
  );
}

/** The identifier under which the server logged it. */
const digestOf = (error: unknown): string | null =>
  error instanceof Error && "digest" in error && typeof error.digest === "string" ? error.digest : null;
