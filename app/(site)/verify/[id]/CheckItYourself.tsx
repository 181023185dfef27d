import { LinkButton } from "@/app/_components/actions/LinkButton";
import { SectionHead } from "@/app/_components/layout/SectionHead";

/** How to check the record without taking this page's word for it. */
export function CheckItYourself({ id, keyId }: { id: string; keyId: string }) {
  return (
    <section aria-labelledby="yourself" className="no-print">
      <SectionHead id="yourself">Check it without us</SectionHead>
      <p className="mb-3 max-w-2xl">
        The signature covers the record&apos;s canonical JSON (RFC 8785) as a detached JWS (RFC 7515). With the signed document and the{" "}
        <a href="/.well-known/jwks.json" className="link">published keys</a> anyone can check it, offline and years from now; short programs for it come with the API. Signed with key{" "}
        <code className="break-all">{keyId}</code>.
      </p>
      <div className="flex flex-wrap gap-2">
        <LinkButton href={`/verify/${id}/certificate.pdf`}>Certificate (PDF)</LinkButton>
        <LinkButton href={`/verify/${id}/signature.json`}>Signed document (JSON)</LinkButton>
      </div>
    </section>
  );
}
