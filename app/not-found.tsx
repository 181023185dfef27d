import { LinkButton } from "./_components/actions/LinkButton";
import { PlainSheet } from "./_components/layout/PlainSheet";

export const metadata = { title: "Page not found" };

export default function NotFound() {
  return (
    <PlainSheet title="Page not found" code="404">
      <p>No page has this address. It may be mistyped, or the page may have moved.</p>
      <div className="mt-4 flex flex-wrap gap-2">
        <LinkButton href="/" variant="primary">
          Home
        </LinkButton>
        <LinkButton href="/docs">Docs</LinkButton>
      </div>
    </PlainSheet>
  );
}
